import { defineBoot } from '#q-app/wrappers';
import { apiEvents } from 'src/api/client';
import { useSessionStore } from 'src/stores/session';

/** When the session has ended, the sign-in page takes over and brings back here afterwards. */
export default defineBoot(({ router, store }) => {
  const session = useSessionStore(store);
  apiEvents.notSignedIn = () => {
    const wasSignedIn = session.signedIn;
    session.forget();
    const { name, fullPath } = router.currentRoute.value;
    if (!wasSignedIn || name === 'sign-in') return;
    void router.push({ name: 'sign-in', query: { to: fullPath, ended: '1' } });
  };
});
