import type { Account, Role } from '#contract';
import type { CellResult } from '#engine';
import { askRemark, answerRemark, setClosed } from '../services/remarks';
import { createCalculation } from '../services/calculations';
import { revisionConditions } from '../services/revisions';
import { lockRevision } from '../services/locking';
import { handOver, signCheck } from '../services/signing';
import { tickCell } from '../services/ticks';
import type { ServerContext } from '../services/context';
import type { Summaries } from '../services/summaries';
import { insertPerson } from '../repositories/people';
import { insertProject, setMember } from '../repositories/projects';
import { hashPassword } from '../services/passwords';
import { computeContent, currentContent } from '../services/documents';
import { authorizeRevision } from '../services/access';

/** Passphrase of all demo accounts, printed at the start. */
export const demoPassword = 'velvet-heron-42';

const people: readonly [signInName: string, name: string, initials: string, role: Role | undefined][] = [
  ['odile.varga', 'O. Varga', 'OV', 'engineer'],
  ['timo.reinholt', 'T. Reinholt', 'TR', 'engineer'],
  ['hanna.quaye', 'H. Quaye', 'HQ', 'checker'],
  ['alasdair.brodie', 'A. Brodie', 'AB', 'lead'],
  ['priya.lindqvarn', 'P. Lindqvarn', 'PL', 'reader'],
  ['admin', 'Administrator', 'AD', undefined],
];

interface Team {
  engineer: Account;
  second: Account;
  checker: Account;
  lead: Account;
}

class Demo {
  constructor(
    private readonly context: ServerContext,
    private readonly summaries: Summaries,
    private readonly projectId: string,
    private readonly team: Team,
  ) {}

  async create(by: Account, title: string, group: string, example: string): Promise<string> {
    const detail = await createCalculation(this.context, this.summaries, by, this.projectId, {
      title,
      group,
      start: { from: 'example', example },
    });
    return detail.revision.id;
  }

  async fingerprint(by: Account, revisionId: string): Promise<string> {
    return (await revisionConditions(this.context, by, revisionId)).contentFingerprint;
  }

  async handOver(revisionId: string, by = this.team.engineer): Promise<void> {
    await handOver(this.context, by, revisionId, {
      password: demoPassword,
      contentFingerprint: await this.fingerprint(by, revisionId),
      checkerId: this.team.checker.id,
    });
  }

  async results(revisionId: string): Promise<CellResult[]> {
    const { calculation, revision } = await authorizeRevision(
      this.context.db,
      this.team.checker.id,
      revisionId,
      'revision.read',
    );
    const content = await currentContent(this.context.db, calculation, revision);
    const results = computeContent(content);
    return content.cells.flatMap((cell) => (cell.kind === 'section' ? [] : (results.cells[cell.id] ?? [])));
  }

  async tick(revisionId: string, most = Infinity): Promise<void> {
    for (const cell of (await this.results(revisionId)).slice(0, most)) {
      await tickCell(this.context, this.summaries, this.team.checker, revisionId, cell.id, cell.fingerprint);
    }
  }

  async check(revisionId: string): Promise<void> {
    const { checker } = this.team;
    await signCheck(this.context, checker, revisionId, {
      password: demoPassword,
      contentFingerprint: await this.fingerprint(checker, revisionId),
    });
  }

  async lock(revisionId: string, changeNote: string): Promise<void> {
    const { lead } = this.team;
    const { contentFingerprint, conditions } = await revisionConditions(this.context, lead, revisionId);
    const reasons = Object.fromEntries(
      conditions
        .flatMap((condition) => condition.items)
        .map((item) => [item.key, 'Accepted for this issue; settled with the next one.']),
    );
    await lockRevision(this.context, lead, revisionId, {
      password: demoPassword,
      contentFingerprint,
      changeNote,
      reasons,
    });
  }

  async remark(revisionId: string, cellId: string, text: string, answer?: string, close = false): Promise<void> {
    const remarks = await askRemark(this.context, this.summaries, this.team.checker, revisionId, { cellId, text });
    const id = remarks.at(-1)?.id ?? '';
    if (answer !== undefined) await answerRemark(this.context, this.summaries, this.team.engineer, id, answer);
    if (close) await setClosed(this.context, this.summaries, this.team.checker, id, true);
  }
}

/** Lays down the demo plant in an empty database: people, a project, calculations in every state. All of it is invented. */
export async function seedDemo(context: ServerContext, summaries: Summaries): Promise<void> {
  const { db } = context;
  if ((await db('people').first('id')) !== undefined) return;
  const passwordHash = await hashPassword(demoPassword);
  const projectId = await insertProject(db, {
    number: '2417',
    title: 'Veldra Ness power house',
    firm: 'Hollin & Strake',
    client: 'Veldra Island Supply',
    place: 'Veldra Ness, engine hall 2',
  });
  const accounts = new Map<string, Account>();
  for (const [signInName, name, initials, role] of people) {
    const account = await insertPerson(db, {
      signInName,
      name,
      initials,
      email: `${signInName}@hollin-strake.example`,
      administrator: role === undefined,
      passwordHash,
    });
    if (role !== undefined) await setMember(db, projectId, account.id, role);
    accounts.set(signInName, account);
  }
  const account = (signInName: string): Account => {
    const found = accounts.get(signInName);
    if (found === undefined) throw new Error(`The demo has no ${signInName}.`);
    return found;
  };
  const team = {
    engineer: account('odile.varga'),
    second: account('timo.reinholt'),
    checker: account('hanna.quaye'),
    lead: account('alasdair.brodie'),
  };
  await seedCalculations(new Demo(context, summaries, projectId, team), team);
}

async function seedCalculations(demo: Demo, { engineer, second }: Team): Promise<void> {
  const cooler = await demo.create(
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
  const main = await demo.create(
    second,
    'Cooling-water main, pressure drop and pump power',
    'Engine cooling water',
    'cooling-water-main',
  );
  await demo.handOver(main, second);
  await demo.tick(main, 3);
  const steam = await demo.create(
    engineer,
    'Heating-steam main, heat loss and jacket temperature',
    'Steam and condensate',
    'steam-main-insulation',
  );
  await demo.handOver(steam);
  await demo.tick(steam);
  await demo.check(steam);
  await demo.lock(steam, 'First issue');
  const pipe = await demo.create(
    second,
    'Charge-air pipe, loss in the draught of the hall',
    'Ventilation',
    'charge-air-pipe',
  );
  await demo.handOver(pipe, second);
  await demo.tick(pipe);
  await demo.check(pipe);
}
