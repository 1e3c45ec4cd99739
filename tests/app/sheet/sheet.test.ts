import { flushPromises, mount } from '@vue/test-utils';
import { createPinia } from 'pinia';
import { QLayout, QPageContainer } from 'quasar';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { defineComponent, h, nextTick } from 'vue';
import { createMemoryHistory, createRouter } from 'vue-router';
import type { Remark, RevisionState, Role, Tick } from '#contract';
import type { CellInput } from '#engine';
import SheetView from 'src/components/revision/SheetView.vue';
import { useRemarks } from 'src/composables/useRemarks';
import { useRevision } from 'src/composables/useRevision';
import { useTicks } from 'src/composables/useTicks';
import { ref } from 'vue';
import { localConnection, people, revisionFor } from '../../helpers/sheet';

const cells: CellInput[] = [
  { id: 's1', kind: 'section', source: 'Givens', settings: {} },
  { id: 'a', kind: 'expressions', source: 'd = 20 mm  # inside\nL = 1.2 m', settings: {} },
  { id: 'b', kind: 'expressions', source: 'r = L/d\nrequire r > 100', settings: { tbv: 'drawing awaited' } },
  { id: 's2', kind: 'section', source: 'Result', settings: {} },
  { id: 'c', kind: 'text', source: 'The ratio is {{r}}.', settings: {} },
  { id: 'e', kind: 'expressions', source: 'x = d + 3 s\ny = x*2\nz = 2 * (', settings: {} },
];

const remark: Remark = {
  id: '00000000-0000-4000-8000-000000000901',
  number: 1,
  cellId: 'b',
  author: people.checker,
  text: 'Which drawing?',
  at: '2026-03-12T09:00:00.000Z',
  state: 'open',
  answers: [],
};

/** Ends what a test has mounted: keys listen at the window. */
const opened: (() => void)[] = [];
let ticks: Tick[] = [];
let refuseTick = false;
const asked: { path: string; method: string; body: unknown }[] = [];
const answer = (body: unknown, status = 200) =>
  new Response(JSON.stringify(body), { status, headers: { 'content-type': 'application/json' } });

function serve(role: Role, state: RevisionState) {
  return async (input: RequestInfo | URL, init: RequestInit = {}) => {
    const path = String(input).replace('/api', '');
    const method = init.method ?? 'GET';
    const body: unknown = typeof init.body === 'string' ? JSON.parse(init.body) : undefined;
    asked.push({ path, method, body });
    if (path.startsWith('/calculations/')) return answer(revisionFor(role, state));
    if (path.endsWith('/remarks')) return answer([remark]);
    if (path.endsWith('/ticks')) return answer(ticks);
    if (path.includes('/ticks/') && refuseTick)
      return answer({ error: { code: 'CONTENT_CHANGED', message: 'The cell has changed meanwhile.' } }, 409);
    if (path.includes('/ticks/')) {
      const cellId = path.split('/').at(-1) ?? '';
      const { fingerprint } = body as { fingerprint: string };
      ticks = [{ cellId, person: people.checker, at: '2026-03-12T09:00:00.000Z', fingerprint, dependsOn: {} }];
      return answer(ticks);
    }
    return answer({ error: { code: 'NOT_FOUND', message: `nothing at ${path}` } }, 404);
  };
}

async function open(role: Role, state: RevisionState, given = cells, line = {}) {
  vi.stubGlobal('fetch', vi.fn(serve(role, state)));
  const local = localConnection(given, line);
  const router = createRouter({
    history: createMemoryHistory(),
    routes: ['sheet', 'report', 'projects', 'register', 'trail', 'fluids', 'relations', 'relation'].map((name) => ({
      path: name === 'sheet' ? '/:calculationId?/:letter?' : `/${name}/:calculationId?/:letter?`,
      name,
      component: { render: () => null },
    })),
  });
  const Host = defineComponent(() => {
    const revision = useRevision('x', ref('A'));
    const remarks = useRemarks(revision.revisionId);
    const marks = useTicks(revision.revisionId, local.connection.results);
    void revision.load();
    return () =>
      h(QLayout, () =>
        h(QPageContainer, () =>
          revision.detail.value === undefined
            ? null
            : h(SheetView, {
                detail: revision.detail.value,
                revision,
                connection: local.connection,
                remarks,
                ticks: marks,
              }),
        ),
      );
  });
  const leaf = document.createElement('div');
  leaf.id = 'leaf';
  document.body.append(leaf);
  const wrapper = mount(Host, { global: { plugins: [createPinia(), router] }, attachTo: document.body });
  opened.push(() => wrapper.unmount());
  await flushPromises();
  const cell = (cellId: string) => wrapper.get(`#cell-${cellId}`);
  const press = async (key: string, more: KeyboardEventInit = {}) => {
    (document.activeElement ?? document.body).dispatchEvent(
      new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true, ...more }),
    );
    await flushPromises();
  };
  const focus = async (cellId: string) => {
    (cell(cellId).element as HTMLElement).focus();
    await nextTick();
  };
  return { wrapper, cell, press, focus, ...local };
}

beforeEach(() => {
  ticks = [];
  refuseTick = false;
  asked.length = 0;
});
afterEach(() => {
  for (const close of opened.splice(0)) close();
  document.body.innerHTML = '';
  vi.unstubAllGlobals();
});

describe('what the sheet shows', () => {
  it('numbers cells by their section, and labels them', async () => {
    const { wrapper } = await open('engineer', 'draft');
    const labels = wrapper.findAll('article').map((article) => article.attributes('aria-label'));
    expect(labels).toEqual([
      'Cell 1, section',
      'Cell 1.1, expressions',
      'Cell 1.2, expressions',
      'Cell 2, section',
      'Cell 2.1, text',
      'Cell 2.2, expressions',
    ]);
  });

  it('sets results at the decimal sign, with the unit apart', async () => {
    const { cell } = await open('engineer', 'draft');
    const [first, second] = cell('a').findAll('output');
    expect(first?.find('.result__whole').text()).toBe('20');
    expect(first?.find('.result__unit').text()).toBe('mm');
    expect(second?.find('.result__whole').text()).toBe('1');
    expect(second?.find('.result__fraction').text()).toBe('.2');
  });

  it('says whether a requirement holds', async () => {
    const { cell } = await open('engineer', 'draft');
    expect(cell('b').find('.result--fails').text()).toBe('does not hold');
  });

  it('puts live values into the text', async () => {
    const { cell } = await open('engineer', 'draft');
    expect(cell('c').find('.inline-value').text()).toBe('60');
  });

  it('says what is wrong at its line; what follows waits, the rest computes', async () => {
    const { cell } = await open('engineer', 'draft');
    const lines = cell('e').findAll('.line');
    expect(lines[0]?.find('.problem').text()).toMatch(/length/);
    expect(lines[0]?.find('.result--none').text()).toContain('no result');
    expect(lines[1]?.find('.result--waits').text()).toContain('waits for x');
    expect(lines[2]?.find('.line__source').text()).toContain('z = 2 * (');
  });

  it('lists in the contents what is open', async () => {
    await open('engineer', 'draft');
    const contents = document.getElementById('leaf')?.textContent ?? '';
    expect(contents).toContain('0 of 4 ticked');
    expect(contents).toMatch(/R1Which drawing\?1\.2/);
    expect(contents).toMatch(/TBV 1drawing awaited1\.2/);
  });

  it('shows the remark in the margin, tied to its cell', async () => {
    const { cell } = await open('engineer', 'draft');
    expect(cell('b').attributes('aria-details')).toBe(`remark-${remark.id}`);
  });
});

describe('writing', () => {
  it('goes from cell to cell, and to sections, by keys', async () => {
    const { press, focus } = await open('engineer', 'draft');
    await focus('a');
    await press('ArrowDown');
    expect(document.activeElement?.id).toBe('cell-b');
    await press('ArrowDown', { ctrlKey: true });
    expect(document.activeElement?.id).toBe('cell-s2');
    await press('ArrowUp', { ctrlKey: true });
    expect(document.activeElement?.id).toBe('cell-s1');
  });

  it('opens the source on Enter, tells the others, and leaves on Esc', async () => {
    const { press, focus, cell, told } = await open('engineer', 'draft');
    await focus('a');
    await press('Enter');
    expect(cell('a').find('.cm-content').exists()).toBe(true);
    expect(told.value).toEqual({ cellId: 'a', writing: true });
    await press('Escape');
    expect(cell('a').find('.cm-content').exists()).toBe(false);
    expect(told.value).toEqual({ cellId: 'a', writing: false });
  });

  it('makes a cell of the pen line, of the kind that was written', async () => {
    const { wrapper, document: shared } = await open('engineer', 'draft');
    const pen = wrapper.get('.pen input');
    await pen.setValue('q = 5 kW');
    await pen.trigger('keydown', { key: 'Enter' });
    await flushPromises();
    expect(shared.cells().at(-1)).toMatchObject({ kind: 'expressions', source: 'q = 5 kW' });
    const next = wrapper.get('.pen input');
    await next.setValue('Now some words.');
    await next.trigger('keydown', { key: 'Enter' });
    await flushPromises();
    expect(shared.cells().at(-1)).toMatchObject({ kind: 'text', source: 'Now some words.' });
  });

  it('moves a cell by Alt and arrow, and takes it back', async () => {
    const { press, focus, document: shared } = await open('engineer', 'draft');
    await focus('b');
    await press('ArrowUp', { altKey: true });
    expect(shared.cells().map((each) => each.id)).toEqual(['s1', 'b', 'a', 's2', 'c', 'e']);
    await press('z', { ctrlKey: true });
    expect(shared.cells().map((each) => each.id)).toEqual(['s1', 'a', 'b', 's2', 'c', 'e']);
  });

  it('deletes a cell in one step that can be undone', async () => {
    const { press, focus, document: shared } = await open('engineer', 'draft');
    await focus('a');
    await press('Delete');
    expect(shared.cells().some((each) => each.id === 'a')).toBe(false);
    expect(document.activeElement?.id).toBe('cell-b');
    await press('z', { ctrlKey: true });
    expect(shared.cells().some((each) => each.id === 'a')).toBe(true);
  });

  it('begins an empty sheet with the purpose', async () => {
    const { wrapper, document: shared } = await open('engineer', 'draft', []);
    const ways = wrapper.findAll('.empty-pad button').map((button) => button.text());
    expect(ways).toEqual(['Write the purpose', 'Lay out the usual sections', 'Write a first line']);
    await wrapper.get('.empty-pad button').trigger('click');
    await flushPromises();
    expect(shared.cells().map((each) => each.kind)).toEqual(['section', 'text']);
  });
});

describe('who may do what', () => {
  it.each<[Role, RevisionState]>([
    ['reader', 'draft'],
    ['checker', 'for check'],
    ['lead', 'draft'],
    ['engineer', 'checked'],
    ['engineer', 'locked'],
  ])('gives a %s at a revision that is %s no pen line and no editor', async (role, state) => {
    const { wrapper, press, focus, cell } = await open(role, state);
    expect(wrapper.find('.pen').exists()).toBe(false);
    await focus('a');
    await press('Enter');
    expect(cell('a').find('.cm-content').exists()).toBe(false);
    await press('Delete');
    expect(wrapper.find('#cell-a').exists()).toBe(true);
  });

  it('lets only the checker tick, by key', async () => {
    const { press, focus, cell } = await open('checker', 'for check');
    await focus('a');
    await press('k');
    expect(asked.some(({ path, method }) => method === 'PUT' && path.endsWith('/ticks/a'))).toBe(true);
    expect(cell('a').get('.cell__tick').attributes('aria-label')).toBe('Tick cell 1.1: ticked by H. Quaye');
  });

  it('fetches the ticks again when the server computes another', async () => {
    refuseTick = true;
    const { press, focus, cell } = await open('checker', 'for check');
    await focus('a');
    asked.length = 0;
    await press('k');
    expect(asked.map(({ method }) => method)).toEqual(['PUT', 'GET']);
    expect(cell('a').get('.cell__tick').attributes('aria-label')).toContain('not yet ticked');
  });

  it('lets a tick fall when a value behind the cell changes, and only then', async () => {
    const fingerprint = localConnection(cells).connection.results.value.get('b')?.fingerprint ?? '';
    ticks = [{ cellId: 'b', person: people.checker, at: '2026-03-12T09:00:00.000Z', fingerprint, dependsOn: {} }];
    const again = await open('checker', 'for check');
    expect(again.cell('b').get('.cell__tick').attributes('aria-label')).toContain('ticked by');
    const source = again.document.source('a');
    again.document.transact(() => source?.insert(source.length, ' # a note'));
    await flushPromises();
    expect(again.cell('b').get('.cell__tick').attributes('aria-label')).toContain('ticked by');
    again.document.transact(() => {
      source?.delete(0, source.length);
      source?.insert(0, 'd = 25 mm\nL = 1.2 m');
    });
    await flushPromises();
    expect(again.cell('b').get('.cell__tick').attributes('aria-label')).toContain('changed since');
  });

  it.each<[Role, RevisionState, string | undefined]>([
    ['engineer', 'draft', 'Hand over for check'],
    ['engineer', 'for check', 'Sign again as prepared'],
    ['checker', 'for check', 'Sign the check'],
    ['lead', 'checked', 'Lock revision A'],
    ['lead', 'locked', 'Begin revision B'],
    ['reader', 'locked', undefined],
  ])('offers a %s at a revision that is %s: %s', async (role, state, word) => {
    const { wrapper } = await open(role, state);
    expect(wrapper.find('.title-action').exists()).toBe(word !== undefined);
    if (word !== undefined) expect(wrapper.get('.title-action').text()).toBe(word);
  });
});

describe('the line to the server', () => {
  it('says how many changes wait, and holds back signatures', async () => {
    const { wrapper } = await open('engineer', 'draft', cells, { kind: 'offline', since: Date.now(), waiting: 4 });
    expect(wrapper.get('.state-line').text()).toMatch(/No line since \d\d:\d\d\. 4 changes wait here\./);
    expect(wrapper.get('.title-action').attributes('aria-disabled')).toBe('true');
    expect(wrapper.find('.sheet--offline').exists()).toBe(true);
    expect(wrapper.find('.pen').exists()).toBe(true);
  });

  it('offers a copy when changes are refused, and lets nobody write on', async () => {
    const { wrapper } = await open('engineer', 'draft', cells, { kind: 'refused', reason: 'The revision was locked.' });
    expect(wrapper.get('.state-line').text()).toContain('Save a copy');
    expect(wrapper.find('.pen').exists()).toBe(false);
  });

  it('lays ruled lines until the sheet is there', async () => {
    const { wrapper } = await open('engineer', 'draft', cells, { kind: 'waiting' });
    expect(wrapper.find('.sheet-loading').exists()).toBe(true);
    expect(wrapper.find('article').exists()).toBe(false);
  });
});
