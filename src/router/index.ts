import { createRouter, createWebHistory } from 'vue-router';
import { Notify } from 'quasar';
import { defineRouter } from '#q-app/wrappers';
import { useSessionStore } from 'src/stores/session';
import { admit } from './guard';
import { routes } from './routes';

/** What browsers say when the file of a lazily loaded page does not come. */
const missingFile = /dynamically imported module|Importing a module script|Unable to preload/;

/** After a new version was put up the files of the old one are gone: the new index knows the new ones. */
function reloadOnce(address: string): void {
  const place = 'wallflux.reloaded';
  const before = Number(sessionStorage.getItem(place) ?? 0);
  if (Date.now() - before < 10_000) return;
  sessionStorage.setItem(place, String(Date.now()));
  window.location.assign(address);
}

export default defineRouter(({ store }) => {
  const router = createRouter({
    history: createWebHistory(process.env.VUE_ROUTER_BASE),
    routes,
    scrollBehavior: (to, _from, saved) => saved ?? (to.hash ? {} : { left: 0, top: 0 }),
  });
  router.beforeEach((to) => admit(to, useSessionStore(store)));
  router.afterEach((to) => {
    document.title = to.meta.title === undefined ? 'Wallflux' : `${to.meta.title} · Wallflux`;
  });
  router.onError((error: unknown, to) => {
    if (!(error instanceof Error && missingFile.test(error.message))) return;
    if (navigator.onLine) reloadOnce(to.fullPath);
    else
      Notify.create({ message: 'There is no line to the server, and this page is not here yet.', classes: 'caution' });
  });
  return router;
});
