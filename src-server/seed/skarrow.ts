import type { Demo } from './demo';
import { condensateCooler, hotWaterRing, milkTank } from './skarrow-content';

/** A smaller project beside the power house, with the same people. */
export async function seedSkarrow(demo: Demo): Promise<void> {
  const { engineer, second } = demo.team;
  const ring = await demo.fromContent(engineer, 'Hot water', hotWaterRing);
  await demo.edit(ring, second, (document) => {
    document.source('c21')?.insert(0, '# readings of 14 October\n');
  });

  const tank = await demo.fromContent(second, 'Cold store', milkTank);
  await demo.handOver(tank, second);
  await demo.tick(tank, 2);
  await demo.remark(
    tank,
    'c31',
    'Say why 60 h and not 48 h.',
    'From Friday noon to Monday, the longest gap of the year.',
  );

  const cooler = await demo.fromContent(engineer, 'Hot water', condensateCooler);
  await demo.issue(cooler, engineer, 'First issue');
}
