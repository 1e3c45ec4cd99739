/** An address of this application to go to after signing in; anything else is not followed. */
export function returnAddress(asked: unknown): string {
  return typeof asked === 'string' && /^\/(?![/\\])/.test(asked) ? asked : '/projects';
}
