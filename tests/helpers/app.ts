import { config } from '@vue/test-utils';
import { Dialog, Notify, Quasar } from 'quasar';

// Every component test mounts with Quasar, as the application does.
config.global.plugins.push([Quasar, { plugins: { Dialog, Notify } }] as never);
