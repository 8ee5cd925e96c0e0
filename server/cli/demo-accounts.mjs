/**
 * The people of the invented demo office, one per role. The seed creates them, the start prints them.
 *
 * @type {ReadonlyArray<{ role: 'admin' | 'engineer' | 'checker' | 'estimator' | 'viewer', name: string, email: string }>}
 */
export const DEMO_ACCOUNTS = [
  { role: 'admin', name: 'Maren Tolliver', email: 'admin@tidemill.example' },
  { role: 'engineer', name: 'Idris Kestrel', email: 'engineer@tidemill.example' },
  { role: 'checker', name: 'Beatriz Holloway', email: 'checker@tidemill.example' },
  { role: 'estimator', name: 'Anselm Pike', email: 'estimator@tidemill.example' },
  { role: 'viewer', name: 'Noor Sandoval', email: 'viewer@tidemill.example' },
];

/** One password for the whole demo office; it stands in the open because it guards nothing but invented data. */
export const DEMO_PASSWORD = 'slack-water-at-noon';
