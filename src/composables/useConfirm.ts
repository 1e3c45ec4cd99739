import { Dialog } from 'quasar';

export interface Question {
  title: string;
  message: string;
  /** The verb on the button that does it. */
  action: string;
  /** The word that leaves things as they are. */
  leave?: string;
}

/** Asks before something that cannot be undone; answers whether to go on. */
export function useConfirm(): (question: Question) => Promise<boolean> {
  return ({ title, message, action, leave = 'Not now' }) =>
    new Promise((resolve) => {
      Dialog.create({
        title,
        message,
        class: 'framed-question',
        ok: { label: action, unelevated: true, noCaps: true, color: 'primary' },
        cancel: { label: leave, outline: true, noCaps: true, color: 'primary' },
        focus: 'cancel',
      })
        .onOk(() => resolve(true))
        .onDismiss(() => resolve(false));
    });
}
