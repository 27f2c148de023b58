/* The gates of one case as four people pass them at their browsers, each called by a mail. */
import { type Page } from '@playwright/test';
import { expect } from '../../support/fixtures';
import { type TestServer } from '../../support/server';
import { fourDigits, workByHand, type Readings } from './by-hand';
import { agreeAll, enterUnseen, raiseFinding, turnFinding } from './checker';
import { send, sign } from './forms';
import { follow, mailTo } from './mail';
import { doStartUp, enterSeen } from './operations';
import { answerAffected, brief, nominate, propose, raise } from './originator';
import { SITE } from './people';

const MAIL = {
  owen: 'owen.tarrant@ketterwold.example',
  ilse: 'ilse.fennimore@ketterwold.example',
  grace: 'grace.okonta@ketterwold.example',
  tomas: 'tomas.adeyre@ketterwold.example',
};
/** What Ilse reads on her own papers: vessel drawing, valve data sheets, rating sheet of the reboiler, simulation of the relief case. */
const READ: Readings = {
  mawp: 3.5,
  barometer: 0.918,
  accumulation: 0.16,
  ua: 125,
  hot: 179.5,
  cold: 165,
  latent: 432.8,
  T: 111.7 + 273.15,
  Z: 0.864,
  M: 58.08,
  k: 1.102,
  Kd: 0.975,
};
const INSTALLED = 2 * 1841; // two L orifices in service (API Std 526: 2.853 in² = 1841 mm²)
const GOVERNS = 'Loss of cooling water';
const MOLAR_MASS = 'Molar mass of Overhead vapour, acetone, at 116 % of MAWP';
const now = workByHand(READ);
const before = workByHand({ ...READ, ua: 110 });
const percent = (area: number) => ((area / INSTALLED) * 100).toFixed(1);

export type Four = { owen: Page; ilse: Page; grace: Page; tomas: Page };

export async function draft(server: TestServer, { owen }: Four): Promise<string> {
  const number = await raise(owen, {
    title: 'P-101 impeller from 212 to 224 mm',
    system: 'SYS-101',
    what: 'The feed pump gets a larger impeller; the reboiler is cleaned for the higher feed and boils up more.',
  });
  await brief(owen, { kind: 'procedure', reference: 'OP-101-03 Start-up of C-101' });
  await nominate(owen, {
    checker: 'Ilse Fennimore',
    approvers: ['Grace Okonta'],
    operations: ['Tomas Adeyre'],
  });
  const answered = await answerAffected(owen, 'The header was sized for more than this load.');
  expect(answered).toBeGreaterThan(2);
  await sign(owen, 'Sign and pass');
  for (const to of [MAIL.ilse, MAIL.grace, MAIL.tomas]) {
    expect((await mailTo(server, to, `${number}: you are nominated`)).text).toContain(
      'Nothing is to be done yet',
    );
  }
  return number;
}

export async function analysis(server: TestServer, number: string, { owen }: Four): Promise<void> {
  await follow(owen, await mailTo(server, MAIL.owen, `${number}: waits for your scenario analysis`));
  await owen.getByRole('link', { name: 'What changes', exact: true }).click();
  const from = { from: 'maker', ref: 'Pump curve P-101, 224 mm impeller' };
  await propose(owen, 'P-101', [{ label: 'Impeller diameter', value: '224', ...from }]);
  await propose(owen, 'E-101', [
    { label: 'Heat, UA', value: '125', from: 'calculation', ref: 'Rating sheet RS-E101 rev 4' },
  ]);
  await expect(owen.getByRole('table', { name: 'Changed so far' })).toContainText('224');
  await owen.getByRole('link', { name: 'Scenarios', exact: true }).first().click();
  const row = owen.locator('details.scenario > summary').filter({ hasText: GOVERNS });
  await expect(row).toContainText(percent(now.area));
  await sign(owen, 'Sign and pass');
}

export async function unseen(server: TestServer, number: string, { ilse }: Four): Promise<void> {
  await follow(ilse, await mailTo(server, MAIL.ilse, `${number}: waits for your check`));
  const valve = (tag: string, set: string) => [
    { label: `Set pressure of ${tag}`, value: set, unit: 'barg', from: `DS-${tag}` },
    { label: `Orifice letter of ${tag}`, value: 'L' },
    { label: `Where ${tag} discharges`, value: 'header' },
  ];
  await enterUnseen(ilse, [
    { label: 'MAWP of C-101, body', value: '3.5', unit: 'barg', from: '101-D-010 rev 4' },
    { label: 'Design temperature of C-101, body', value: '180', unit: '°C', from: '101-D-010 rev 3' },
    ...valve('PSV-101A', '3.5'),
    ...valve('PSV-101B', '3.65'),
    { label: 'Which scenario governs group G1', value: GOVERNS },
    { label: 'Phase at relief in what governs group G1', value: 'vapour' },
  ]);
  await enterUnseen(ilse, [
    { label: MOLAR_MASS, value: '58.08', unit: 'kg/kmol', from: 'substance data card' },
  ]);
  await enterUnseen(ilse, [
    { label: `Limit pressure, ${GOVERNS}`, value: fourDigits(now.limit), unit: 'barg' },
    { label: `Relieving pressure P1, ${GOVERNS}`, value: fourDigits(now.P1), unit: 'bara' },
    { label: `Relief load, ${GOVERNS}`, value: fourDigits(now.load), unit: 'kg/h' },
    { label: `Required area, ${GOVERNS}`, value: fourDigits(now.area), unit: 'mm²' },
  ]);
}

/** What differs is reconciled in writing: a design temperature was read from a drawing of another issue. */
export async function reveal(_server: TestServer, number: string, { ilse }: Four): Promise<void> {
  await ilse.goto(`${SITE}/cases/${number}/unseen`);
  await ilse.getByRole('link', { name: 'Check your answers, then show both sides' }).click();
  await send(ilse, 'Show both sides');
  const both = ilse.getByRole('table', { name: 'Both sides, SYS-101' });
  for (const what of ['Limit pressure', 'Relieving pressure P1', 'Relief load', 'Required area']) {
    await expect(both.getByRole('row', { name: new RegExp(`^${what}`) })).toContainText('within');
  }
  const odd = both.getByRole('row', { name: /^Design temperature/ });
  await expect(odd).toContainText('outside');
  await odd.getByText('Reconcile in writing').click();
  await odd
    .getByRole('textbox')
    .fill('Issue 4 of the drawing says 185 °C; I had issue 3. The sheet is right.');
  await send(odd, 'Reconcile');
  await expect(odd).toContainText('The sheet is right.');
}

/** A finding goes to the originator and back by mail; then the sheets are agreed and the check is signed. */
export async function check(server: TestServer, number: string, { owen, ilse }: Four): Promise<void> {
  const base = `${SITE}/cases/${number}`;
  await raiseFinding(ilse, base, {
    place: 'Technical basis',
    weight: 'Must fix',
    text: 'Say for which feed the pump curve holds.',
  });
  await follow(owen, await mailTo(server, MAIL.owen, `${number}: finding 1 was raised`));
  await turnFinding(owen, 1, {
    button: 'Answer',
    label: 'Your answer',
    text: 'It holds for 14 m³/h, as before.',
  });
  await follow(ilse, await mailTo(server, MAIL.ilse, `${number}: finding 1 was answered`));
  await turnFinding(ilse, 1, { button: 'Close finding', label: 'Why it is settled', text: 'Settled.' });
  expect(await agreeAll(ilse, base)).toBeGreaterThan(5);
  await ilse.getByRole('link', { name: 'Sign-offs', exact: true }).click();
  await sign(ilse, 'Sign and pass to approval');
}

export async function approval(server: TestServer, number: string, { grace }: Four): Promise<void> {
  await follow(grace, await mailTo(server, MAIL.grace, `${number}: waits for your signature`));
  const main = grace.getByRole('main');
  await expect(main).toContainText(percent(before.area));
  await expect(main).toContainText(percent(now.area));
  await expect(main).toContainText(/212.*224/s);
  await grace.setViewportSize({ width: 1440, height: 900 });
  const height = await grace.evaluate(() => document.documentElement.scrollHeight);
  expect(height, 'the summary to sign is about two screens').toBeLessThanOrEqual(1850);
  await sign(grace, 'Sign and approve');
}

/** Between signature and confirmation the register and the system show what stands and what was approved. */
export async function bothTruths(_server: TestServer, _number: string, { grace }: Four): Promise<void> {
  await grace.goto(`${SITE}/register/systems?q=SYS-101`);
  await expect(grace.getByRole('main')).toContainText('approved, not installed');
  await expect(grace.getByRole('main')).toContainText(percent(before.area));
  await expect(grace.getByRole('main')).toContainText(percent(now.area));
  await grace.goto(`${SITE}/systems/SYS-101`);
  await expect(grace.getByRole('main')).toContainText('approved, not installed');
  await expect(grace.getByRole('main')).toContainText('5, in force');
}

/** A wrong reading holds the confirmation until it is put right and seen again. */
export async function field(server: TestServer, number: string, { owen, tomas }: Four): Promise<void> {
  const base = `${SITE}/cases/${number}`;
  await tomas.setViewportSize({ width: 390, height: 844 });
  await follow(tomas, await mailTo(server, MAIL.tomas, `${number}: waits in the field`));
  await tomas.getByRole('link', { name: /^Go on/ }).click();
  await expect(tomas.getByRole('main')).not.toContainText('224');
  const label = 'P-101: impeller diameter';
  await enterSeen(tomas, { label, value: '222', button: 'Enter what you see' });
  const block = tomas.url();
  await expect(tomas.getByRole('main')).toContainText('224');
  await mailTo(server, MAIL.owen, `${number}: a discrepancy holds the start-up`);
  expect(await doStartUp(tomas, base), 'safety review and training').toBe(2);
  expect(await doStartUp(owen, base), 'the procedure').toBe(1);
  await tomas.goto(`${base}/field?at=sign`);
  await expect(tomas.getByText('Start-up is held. What is open:')).toBeVisible();
  await expect(tomas.getByRole('button', { name: 'Sign and put in force' })).toHaveCount(0);
  await tomas.goto(block);
  await tomas
    .getByLabel('What was put right, or what you misread')
    .fill('I read the tag of the old spare; measured again.');
  await send(tomas, 'Put right, see it again');
  await enterSeen(tomas, { label, value: '224', button: 'Enter what is there now' });
}

export async function confirm(server: TestServer, number: string, { owen, tomas }: Four): Promise<void> {
  await tomas.goto(`${SITE}/cases/${number}/field?at=sign`);
  await sign(tomas, 'Sign and put in force');
  await follow(owen, await mailTo(server, MAIL.owen, `${number}: SYS-101 is in force`));
  await owen.goto(`${SITE}/register/systems?q=SYS-101`);
  const row = owen.getByRole('row', { name: /SYS-101/ });
  await expect(row).toContainText(percent(now.area));
  await expect(owen.getByRole('main')).not.toContainText('approved, not installed');
  await owen.goto(`${SITE}/systems/SYS-101`);
  await expect(owen.getByRole('main')).toContainText('6, in force');
  await expect(owen.getByRole('main')).toContainText(percent(now.area));
}

/** The trail tells all of it, each gate by who passed it. */
export async function trail(_server: TestServer, number: string, { grace }: Four): Promise<void> {
  await grace.goto(`${SITE}/cases/${number}/trail`);
  const lines = grace.getByRole('main').getByRole('listitem');
  for (const name of ['Owen Tarrant', 'Ilse Fennimore', 'Grace Okonta', 'Tomas Adeyre']) {
    await expect(lines.filter({ hasText: name }).first()).toBeVisible();
  }
}
