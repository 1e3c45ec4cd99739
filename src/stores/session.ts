import { computed, ref } from 'vue';
import { defineStore } from 'pinia';
import type { Account, SignInRequest } from '#contract';
import { ApiError } from 'src/api/api-error';
import * as api from 'src/api/session';

/** Who works here. `undefined` = not asked yet, `null` = nobody. */
export const useSessionStore = defineStore('session', () => {
  const person = ref<Account | null>();
  const signedIn = computed(() => person.value !== undefined && person.value !== null);
  const administrator = computed(() => person.value?.administrator === true);

  /** Asks the server once who is signed in; without a line nobody is, until the next try. */
  async function load(): Promise<void> {
    if (person.value) return;
    try {
      person.value = (await api.getSession()).person;
    } catch (error) {
      if (error instanceof ApiError && error.code === 'NOT_SIGNED_IN') person.value = null;
      else throw error;
    }
  }

  async function signIn(request: SignInRequest): Promise<void> {
    person.value = (await api.signIn(request)).person;
  }

  async function signOut(): Promise<void> {
    await api.signOut();
    forget();
  }

  /** The session ended elsewhere. */
  function forget(): void {
    person.value = null;
  }

  return { person, signedIn, administrator, load, signIn, signOut, forget };
});
