import { enableAutoUnmount, mount } from '@vue/test-utils';
import { createPinia, setActivePinia } from 'pinia';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { defineComponent, h } from 'vue';
import { pressedKeys, useShortcuts } from 'src/composables/useShortcuts';
import { usePreferencesStore } from 'src/stores/preferences';

enableAutoUnmount(afterEach);
const run = vi.fn();
beforeEach(() => {
  run.mockReset();
  localStorage.clear();
  setActivePinia(createPinia());
  document.body.innerHTML = '';
});

function page(keys: string, whileWriting = false) {
  const component = defineComponent({
    setup() {
      useShortcuts([{ keys, whileWriting, run }]);
      return () => h('div', [h('input'), h('button', 'x')]);
    },
  });
  return mount(component, { attachTo: document.body });
}
const press = (target: Element, init: KeyboardEventInit) => {
  const event = new KeyboardEvent('keydown', { bubbles: true, cancelable: true, ...init });
  target.dispatchEvent(event);
  return event;
};

it.each([
  [{ key: 'f', ctrlKey: true }, 'Ctrl+F'],
  [{ key: 'F', ctrlKey: true, shiftKey: true }, 'Ctrl+Shift+F'],
  [{ key: 'z', metaKey: true }, 'Ctrl+Z'],
  [{ key: 'ArrowUp', altKey: true }, 'Alt+ArrowUp'],
  [{ key: 'F6', shiftKey: true }, 'Shift+F6'],
])('%j is written %s', (init, expected) => {
  expect(pressedKeys(new KeyboardEvent('keydown', init))).toBe(expected);
});

describe('shortcuts', () => {
  it('act, and the browser’s own meaning does not', () => {
    const wrapper = page('Ctrl+F', true);
    const event = press(wrapper.find('button').element, { key: 'f', ctrlKey: true });
    expect(run).toHaveBeenCalledOnce();
    expect(event.defaultPrevented).toBe(true);
  });

  it('leave letters in a field to the text, whatever they are bound to', () => {
    const wrapper = page('M', true);
    press(wrapper.find('input').element, { key: 'm' });
    expect(run).not.toHaveBeenCalled();
    press(wrapper.find('button').element, { key: 'm' });
    expect(run).toHaveBeenCalledOnce();
  });

  it('leave letters alone once they are switched off (WCAG 2.1.4)', () => {
    usePreferencesStore().letterKeys = false;
    const wrapper = page('M');
    press(wrapper.find('button').element, { key: 'm' });
    expect(run).not.toHaveBeenCalled();
  });

  it('rest while a dialog is open, and are gone with their page', () => {
    const wrapper = page('F2');
    const dialog = document.createElement('div');
    dialog.className = 'q-dialog';
    document.body.append(dialog);
    press(wrapper.find('button').element, { key: 'F2' });
    expect(run).not.toHaveBeenCalled();
    dialog.remove();
    wrapper.unmount();
    press(document.body, { key: 'F2' });
    expect(run).not.toHaveBeenCalled();
  });
});
