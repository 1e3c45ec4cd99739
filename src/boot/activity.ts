import { LoadingBar } from 'quasar';
import { defineBoot } from '#q-app/wrappers';
import { apiEvents } from 'src/api/client';

/** A thin bar at the top while the server is asked. */
export default defineBoot(() => {
  apiEvents.begin = () => LoadingBar.start();
  apiEvents.end = () => LoadingBar.stop();
});
