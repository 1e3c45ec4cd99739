import { mount, flushPromises } from '@vue/test-utils';
import { describe, expect, it } from 'vitest';
import { createMemoryHistory, createRouter } from 'vue-router';
import type { RegisterRow } from '#contract';
import RegisterTable from 'src/components/register/RegisterTable.vue';
import type { RegisterLine, RegisterSort } from 'src/composables/registerLines';

const row = (number: string): RegisterRow => ({
  calculationId: `id-${number}`,
  revisionId: 'r',
  number,
  title: `Title ${number}`,
  group: 'Sea water',
  letter: 'B',
  state: 'superseded',
  cells: 4,
  ticked: 1,
  changed: 2,
  openRemarks: 3,
  tbv: 0,
  outsideRange: 1,
  lastChange: '2026-03-01T10:00:00.000Z',
  lastChangeBy: 'O. Varga',
  prepares: ['OV', 'TR'],
  checks: ['HQ'],
  mine: true,
});
const lines: RegisterLine[] = [
  { key: 'group A', type: 'group', letter: 'A', title: 'Sea water', count: 2 },
  { key: 'id-1', type: 'row', row: row('1') },
  { key: 'id-2', type: 'row', row: row('2') },
];

function mounted(sort: RegisterSort = { column: 'number', descending: false }) {
  const empty = { template: '<i />' };
  const router = createRouter({
    history: createMemoryHistory(),
    routes: [
      { path: '/', component: empty },
      { path: '/calculations/:calculationId/:letter?', name: 'sheet', component: empty },
    ],
  });
  const wrapper = mount(RegisterTable, {
    props: { lines, sort },
    global: { plugins: [router] },
    attachTo: document.body,
  });
  return { wrapper, router };
}

describe('the register as a table', () => {
  it('leads to the revision that stands in the line', () => {
    const { wrapper } = mounted();
    expect(wrapper.find('[data-line="id-1"] a').attributes('href')).toBe('/calculations/id-1/B');
  });

  it('says its marks in words for readers’ software', () => {
    const { wrapper } = mounted();
    const line = wrapper.find('[data-line="id-1"]');
    expect(line.find('[role="img"]').attributes('aria-label')).toBe('1 of 4 ticked, 2 changed since');
    expect(line.text()).toContain('3 open remarks');
    expect(line.text()).toContain('1 outside range');
  });

  it('goes from title to title with Down, Up, End and Home', async () => {
    const { wrapper } = mounted();
    const press = async (key: string) => {
      await wrapper.find('.register').trigger('keydown', { key });
      await flushPromises();
      return document.activeElement?.closest('[data-line]')?.getAttribute('data-line');
    };
    expect(await press('ArrowDown')).toBe('id-1');
    expect(await press('ArrowDown')).toBe('id-2');
    expect(await press('ArrowDown')).toBe('id-2');
    expect(await press('Home')).toBe('id-1');
    expect(await press('End')).toBe('id-2');
    expect(await press('ArrowUp')).toBe('id-1');
  });

  it('sorts by a column, and the other way when pressed again', async () => {
    const { wrapper } = mounted({ column: 'title', descending: false });
    const heads = wrapper.findAll('thead th');
    expect(heads[1]?.attributes('aria-sort')).toBe('ascending');
    await heads[1]?.find('button').trigger('click');
    await heads[5]?.find('button').trigger('click');
    expect(wrapper.emitted('update:sort')).toEqual([
      [{ column: 'title', descending: true }],
      [{ column: 'remarks', descending: false }],
    ]);
  });

  it('opens a line that is pressed anywhere', async () => {
    const { wrapper, router } = mounted();
    await wrapper.find('[data-line="id-2"] td:last-child').trigger('click');
    await flushPromises();
    expect(router.currentRoute.value.fullPath).toBe('/calculations/id-2/B');
  });
});
