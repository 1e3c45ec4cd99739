import { config } from '@vue/test-utils';
import { Dialog, Notify, Quasar } from 'quasar';

// Every component test mounts with Quasar, as the application does.
config.global.plugins.push([Quasar, { plugins: { Dialog, Notify } }] as never);

// The documents of the test environment have no doctype; formulas are only set in standards mode.
Object.defineProperty(document, 'compatMode', { value: 'CSS1Compat', configurable: true });
