import { LoadingBar } from 'quasar';
import { defineBoot } from '#q-app/wrappers';
import { apiEvents } from 'src/api/client';

/** A thin bar at the top while the server is asked. */
export default defineBoot(() => {
  // For the eye only: pages say themselves what they wait for.
  document.getElementById('q-loading-bar')?.setAttribute('aria-hidden', 'true');
  apiEvents.begin = () => LoadingBar.start();
  apiEvents.end = () => LoadingBar.stop();
});
