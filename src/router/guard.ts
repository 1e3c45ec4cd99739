import type { RouteLocationNormalized, RouteLocationRaw } from 'vue-router';
import { returnAddress } from 'src/composables/returnAddress';

interface Session {
  signedIn: boolean;
  administrator: boolean;
  load(): Promise<void>;
}

/** Who is not signed in goes to the sign-in page, and comes back to where he or she wanted. */
export async function admit(to: RouteLocationNormalized, session: Session): Promise<true | RouteLocationRaw> {
  try {
    await session.load();
  } catch {
    // No line: the page itself says so, and offers to try again.
    return to.meta.open === true ? true : { name: 'sign-in', query: { to: to.fullPath } };
  }
  if (to.name === 'sign-in') return session.signedIn ? returnAddress(to.query.to) : true;
  if (!session.signedIn) return { name: 'sign-in', query: to.fullPath === '/projects' ? {} : { to: to.fullPath } };
  if (to.meta.administrator === true && !session.administrator) return { name: 'not-found', params: { rest: [] } };
  return true;
}
