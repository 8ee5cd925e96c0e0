import type { RequestHandler } from 'express';
import type pg from 'pg';
import { databaseAway } from '../errors.ts';

/** Well means that the database answers too. */
export const health =
  (pool: pg.Pool): RequestHandler =>
  async (_req, res) => {
    await pool.query('select 1').catch(() => {
      throw databaseAway();
    });
    res.json({ isHealthy: true });
  };
