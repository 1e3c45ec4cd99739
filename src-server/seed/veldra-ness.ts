import type { Demo } from './demo';

const withTbv = 'From 0.1 to 0.4 the loss moves by a few per cent and the jacket stays below the limit.';

/** The calculations of the power house, from the examples: one in each state. */
export async function seedVeldraNess(demo: Demo): Promise<void> {
  const { engineer, second } = demo.team;
  const cooler = await demo.fromExample(
    engineer,
    'Jacket-water cooler, tube-side film coefficient',
    'Engine cooling water',
    'jacket-water-cooler',
  );
  const [first, , , , flow] = await demo.results(cooler);
  await demo.tick(cooler, 6);
  if (first !== undefined)
    await demo.remark(cooler, first.id, 'Name the drawing of the bundle.', 'CT-88, added to the givens.', true);
  if (flow !== undefined) await demo.remark(cooler, flow.id, 'Why is one pass assumed?');

  const main = await demo.fromExample(
    second,
    'Cooling-water main, pressure drop and pump power',
    'Engine cooling water',
    'cooling-water-main',
  );
  await demo.handOver(main, second);
  await demo.tick(main, 3);

  const steam = await demo.fromExample(
    engineer,
    'Heating-steam main, heat loss and jacket temperature',
    'Steam and condensate',
    'steam-main-insulation',
  );
  await demo.issue(steam, engineer, 'First issue', withTbv);
  const measured = await demo.begin(steam, engineer);
  await demo.edit(measured, engineer, (document) => {
    const given = document.cells().find((cell) => (cell.settings.tbv ?? '') !== '');
    if (given !== undefined) document.setCellSetting(given.id, 'tbv', undefined);
  });
  await demo.issue(measured, engineer, 'Emissivity of the jacket confirmed on site; no result moves');

  const pipe = await demo.fromExample(
    second,
    'Charge-air pipe, loss in the draught of the hall',
    'Ventilation',
    'charge-air-pipe',
  );
  await demo.handOver(pipe, second);
  await demo.check(pipe);
}
