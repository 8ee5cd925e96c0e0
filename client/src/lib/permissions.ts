import type { Role } from '#shared/contract/records.ts';

/** What a role is offered on screen. The server decides; this only keeps a button from being shown in vain. */
export const ACTIONS = [
  'create-project',
  'edit-basis',
  'edit-beams',
  'run-sweeps',
  'pin',
  'edit-price-book',
  'set-members',
  'comment',
  'share',
  'see-rates',
  'save-views',
  'see-standards',
  'set-standards',
  'operate',
] as const;
export type Action = (typeof ACTIONS)[number];

const ALLOWED: Readonly<Record<Role, readonly Action[]>> = {
  admin: ACTIONS,
  engineer: [
    'create-project',
    'edit-basis',
    'edit-beams',
    'run-sweeps',
    'pin',
    'set-members',
    'comment',
    'share',
    'see-rates',
    'save-views',
    'see-standards',
  ],
  checker: ['comment', 'see-rates', 'save-views', 'see-standards'],
  estimator: ['edit-price-book', 'comment', 'see-rates', 'save-views', 'see-standards'],
  viewer: [],
};

export const isAllowed = (role: Role, action: Action): boolean => ALLOWED[role].includes(action);
