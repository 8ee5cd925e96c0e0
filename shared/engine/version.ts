/** Stamped on every stored result. Raise it whenever a released number can change, and say why in DEVELOPERS.md. */
export const ENGINE_VERSION = '1.2.0';
