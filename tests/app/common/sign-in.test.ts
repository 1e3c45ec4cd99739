import { flushPromises, mount } from '@vue/test-utils';
import { createPinia } from 'pinia';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import SignInForm from 'src/components/common/SignInForm.vue';

const fetched = vi.fn<typeof fetch>();
vi.stubGlobal('fetch', fetched);
const refusal = (status: number, code: string) => async () =>
  new Response(JSON.stringify({ error: { code, message: 'as the server says' } }), { status });
const broken = async (): Promise<Response> => {
  throw new TypeError('Failed to fetch');
};
const account = {
  id: '00000000-0000-4000-8000-000000000001',
  signInName: 'odile.varga',
  name: 'O. Varga',
  initials: 'OV',
  email: 'odile.varga@hollin-strake.example',
  administrator: false,
  active: true,
};

// In braces: a function that is handed back would be called when the test ends.
beforeEach(() => {
  fetched.mockReset();
});

async function submitted(answer: () => Promise<Response>) {
  fetched.mockImplementation(answer);
  const wrapper = mount(SignInForm, { props: { ended: false }, global: { plugins: [createPinia()] } });
  await wrapper.find('input[name=username]').setValue(' odile.varga ');
  await wrapper.find('input[name=password]').setValue(' velvet-heron-42');
  await wrapper.find('form').trigger('submit');
  await flushPromises();
  return wrapper;
}

describe('signing in', () => {
  it('sends the name without spaces around it, the passphrase as written', async () => {
    const wrapper = await submitted(async () => new Response(JSON.stringify({ person: account })));
    expect(fetched.mock.calls[0]?.[1]?.body).toBe('{"signInName":"odile.varga","password":" velvet-heron-42"}');
    expect(wrapper.emitted('done')).toHaveLength(1);
  });

  it.each([
    ['wrong passphrase', refusal(401, 'WRONG_PASSWORD'), 'do not belong together'],
    ['too many tries', refusal(429, 'TOO_MANY_TRIES'), 'Too many tries'],
    ['empty fields', refusal(400, 'INVALID_INPUT'), 'both your name and your passphrase'],
    ['no line', broken, 'no line to the server'],
    ['anything else', refusal(500, 'INTERNAL'), 'As the server says'],
  ])('says in words what went wrong: %s', async (_case, answer, words) => {
    const wrapper = await submitted(answer);
    expect(wrapper.find('[role=alert]').text()).toContain(words);
    expect(wrapper.find('input[name=password]').attributes('aria-describedby')).toBe(
      wrapper.find('[role=alert]').attributes('id'),
    );
    expect(wrapper.emitted('done')).toBeUndefined();
  });

  it('hints at Caps Lock while the passphrase is written', async () => {
    const wrapper = mount(SignInForm, { props: { ended: false }, global: { plugins: [createPinia()] } });
    const event = new KeyboardEvent('keydown', { key: 'A' });
    vi.spyOn(event, 'getModifierState').mockReturnValue(true);
    wrapper.find('input[name=password]').element.dispatchEvent(event);
    await flushPromises();
    expect(wrapper.text()).toContain('Caps Lock is on.');
  });

  it('says that the session has ended', () => {
    const wrapper = mount(SignInForm, { props: { ended: true }, global: { plugins: [createPinia()] } });
    expect(wrapper.find('[role=status]').text()).toContain('Your session has ended');
  });
});
