/**
 * Colours of what leaves the page as a picture: those of light paper on white, whatever the screen's scheme. A file has no
 * style sheet, so tokens.css is repeated here.
 */
export const PAPER_COLOURS = {
  paper: '#ffffff',
  ink: '#1e2629',
  muted: '#5d666a',
  rule: '#d9d5ca',
  concrete: '#e3e0d8',
  concreteEdge: '#82888a',
  steel: '#a8442a',
  meets: '#1f6b5c',
  near: '#b7791f',
} as const;
