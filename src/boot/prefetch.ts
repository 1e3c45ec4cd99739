import { defineBoot } from '#q-app/wrappers';

/** Pages that most people open next. */
const likely = [() => import('src/pages/SheetPage.vue'), () => import('src/pages/TrailPage.vue')];

/** Once a page of the binder stands, the likely next ones are fetched while nothing else is to be done. */
export default defineBoot(({ router }) => {
  const stop = router.afterEach((to) => {
    if (to.name === 'sign-in') return;
    stop();
    const whenIdle = window.requestIdleCallback ?? ((run: () => void) => window.setTimeout(run, 2000));
    // A file that does not come is asked for again when its page is opened.
    whenIdle(() => likely.forEach((page) => void page().catch(() => undefined)));
  });
});
