import 'vue-router';

declare module 'vue-router' {
  interface RouteMeta {
    title?: string;
    /** Can be visited without being signed in. */
    open?: boolean;
    administrator?: boolean;
  }
}
