import { describe, expect, it } from 'vitest';
import type { RouteLocationNormalized } from 'vue-router';
import { returnAddress } from 'src/composables/returnAddress';
import { admit } from 'src/router/guard';

describe('the address to go back to', () => {
  it.each([
    ['/projects/1/trail?calculation=2', '/projects/1/trail?calculation=2'],
    ['//evil.example', '/projects'],
    ['/\\evil.example', '/projects'],
    ['https://evil.example', '/projects'],
    ['javascript:alert(1)', '/projects'],
    [undefined, '/projects'],
    [['/a', '/b'], '/projects'],
  ])('%j → %s', (asked, expected) => expect(returnAddress(asked)).toBe(expected));
});

const place = (change: Partial<RouteLocationNormalized>) =>
  ({ name: 'register', fullPath: '/projects/1', query: {}, meta: {}, ...change }) as RouteLocationNormalized;
const session = (signedIn: boolean, administrator = false, load = () => Promise.resolve()) => ({
  signedIn,
  administrator,
  load,
});

describe('who is admitted', () => {
  it('sends who is not signed in to the sign-in page, with the way back', async () => {
    expect(await admit(place({}), session(false))).toEqual({ name: 'sign-in', query: { to: '/projects/1' } });
  });

  it('lets who is signed in pass', async () => {
    expect(await admit(place({}), session(true))).toBe(true);
  });

  it('does not show the sign-in page to who is signed in', async () => {
    const to = place({
      name: 'sign-in',
      fullPath: '/sign-in?to=/fluids',
      query: { to: '/fluids' },
      meta: { open: true },
    });
    expect(await admit(to, session(true))).toBe('/fluids');
    expect(await admit(to, session(false))).toBe(true);
  });

  it('keeps pages of administrators from others', async () => {
    const people = place({ name: 'people', meta: { administrator: true } });
    expect(await admit(people, session(true, false))).toMatchObject({ name: 'not-found' });
    expect(await admit(people, session(true, true))).toBe(true);
  });

  it('shows the sign-in page also without a line', async () => {
    const broken = session(false, false, () => Promise.reject(new Error('no line')));
    expect(await admit(place({ name: 'sign-in', meta: { open: true } }), broken)).toBe(true);
    expect(await admit(place({}), broken)).toMatchObject({ name: 'sign-in' });
  });
});
