import type { RouteRecordRaw } from 'vue-router';

/** Pages are loaded on the first visit, so that signing in and the register stay light. */
export const routes: RouteRecordRaw[] = [
  {
    path: '/sign-in',
    name: 'sign-in',
    component: () => import('src/pages/SignInPage.vue'),
    meta: { open: true, title: 'Sign in' },
  },
  {
    path: '/',
    component: () => import('src/layouts/MainLayout.vue'),
    children: [
      { path: '', redirect: { name: 'projects' } },
      {
        path: 'projects',
        name: 'projects',
        component: () => import('src/pages/ProjectsPage.vue'),
        meta: { title: 'Projects' },
      },
      {
        path: 'projects/:projectId',
        name: 'register',
        component: () => import('src/pages/RegisterPage.vue'),
        props: true,
        meta: { title: 'Register' },
      },
      {
        path: 'projects/:projectId/trail',
        name: 'trail',
        component: () => import('src/pages/TrailPage.vue'),
        props: true,
        meta: { title: 'Trail' },
      },
      {
        path: 'calculations/:calculationId/:letter?',
        name: 'sheet',
        component: () => import('src/pages/SheetPage.vue'),
        meta: { title: 'Sheet' },
      },
      {
        path: 'calculations/:calculationId/:letter/report',
        name: 'report',
        component: () => import('src/pages/ReportPage.vue'),
        meta: { title: 'Report' },
      },
      {
        path: 'fluids',
        name: 'fluids',
        component: () => import('src/pages/FluidsPage.vue'),
        meta: { title: 'Fluids' },
      },
      {
        path: 'relations',
        name: 'relations',
        component: () => import('src/pages/RelationsPage.vue'),
        meta: { title: 'Relations' },
      },
      {
        path: 'relations/:relationId',
        name: 'relation',
        component: () => import('src/pages/RelationPage.vue'),
        props: true,
        meta: { title: 'Relation' },
      },
      {
        path: 'people',
        name: 'people',
        component: () => import('src/pages/PeoplePage.vue'),
        meta: { title: 'People', administrator: true },
      },
      {
        path: 'account',
        name: 'account',
        component: () => import('src/pages/AccountPage.vue'),
        meta: { title: 'Account' },
      },
      {
        path: ':rest(.*)*',
        name: 'not-found',
        component: () => import('src/pages/NotFoundPage.vue'),
        meta: { title: 'Not found' },
      },
    ],
  },
];
