import { createRouter, createWebHistory } from 'vue-router';
import { defineRouter } from '#q-app/wrappers';
import { useSessionStore } from 'src/stores/session';
import { admit } from './guard';
import { routes } from './routes';

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
  // A page's file may be gone after a new version was put up: fetch the new index once.
  router.onError((error: unknown, to) => {
    if (error instanceof Error && /dynamically imported module|Importing a module script/.test(error.message)) {
      window.location.assign(to.fullPath);
    }
  });
  return router;
});
