import { expect, test, type Page } from '@playwright/test';
import sharp from 'sharp';
import * as accounts from '../../shared/contracts/accounts.ts';
import * as commissions from '../../shared/contracts/commissions.ts';
import { getFitReport } from '../../shared/contracts/fit-reports.ts';
import * as handoffs from '../../shared/contracts/handoffs.ts';
import * as joints from '../../shared/contracts/joints.ts';
import * as partsAndLegs from '../../shared/contracts/parts-and-legs.ts';
import { openThread } from '../../shared/contracts/threads.ts';
import { addDays, isWorkingDay, shortDay, weekdayDayMonth } from '../../shared/units/calendar-day.ts';
import { call, signIn, tokenFor, tryCall } from './people.ts';

const TITLE = 'The Tide Bell';
const SECRETS = {
  report: 'Chassis binds at the third ring',
  method: 'Relieve the chassis ends by a light skim on the small lathe',
  cost: '37',
  makers: 'Between us makers: the bore was honed twice',
};

interface World {
  lead: Page;
  maker: Page;
  installer: Page;
  client: Page;
  commissionId: string;
  jointId: string;
  handoffId: string;
}

/** A commission of four parties: every one of them came through a letter. */
async function makeWorld(lead: Page, maker: Page, installer: Page, client: Page): Promise<World> {
  const me = await call(lead, accounts.getMe, {});
  const { id: commissionId } = await call(lead, commissions.createCommission, {
    body: {
      leadShopId: me.shops[0]?.shopId ?? '',
      title: TITLE,
      brief: 'A bell-mouthed hilt.',
      dateWanted: null,
      budgetMinor: 150000,
      currency: 'EUR',
      alsoRoles: [],
    },
  });
  const params = { commissionId };
  const guests = [
    [maker, { kind: 'shop', email: 'ines@aldgrove.example', roles: ['maker'] }],
    [installer, { kind: 'shop', email: 'sefa@tinderlane.example', roles: ['installer'] }],
    [client, { kind: 'client', email: 'orla@penhallow.example' }],
  ] as const;
  for (const [page, invitation] of guests) {
    await call(lead, commissions.inviteParty, {
      params,
      body: { ...invitation, ...('roles' in invitation ? { roles: [...invitation.roles] } : {}) } as never,
    });
    const shops = (await call(page, accounts.getMe, {})).shops;
    await call(page, accounts.acceptInvitation, {
      body: { token: await tokenFor(invitation.email, TITLE), ...(shops[0] ? { shopId: shops[0].shopId } : {}) },
    });
  }
  const { parties } = await call(lead, commissions.listParties, { params });
  const party = (name: string): string => parties.find((one) => one.displayName === name)?.id ?? '';
  const [aldgrove, tinder] = [party('Aldgrove Turning'), party('Tinder Lane Electrics')];
  await call(lead, commissions.updateCommission, { params, body: { revision: 1, state: 'at-work' } });
  const hilt = await call(lead, partsAndLegs.createPart, {
    params,
    body: { name: 'Hilt', kind: 'hilt', holderPartyId: aldgrove },
  });
  const chassis = await call(lead, partsAndLegs.createPart, {
    params,
    body: { name: 'Chassis', kind: 'chassis', holderPartyId: tinder },
  });
  const days = { hopefulDays: 3, likelyDays: 5, badDays: 9 };
  const turning = await call(lead, partsAndLegs.createLeg, {
    params,
    body: {
      partyId: aldgrove,
      partId: hilt.id,
      kind: 'machining',
      title: 'Turn and hollow',
      ...days,
      plannedStartOn: null,
      afterLegIds: [],
    },
  });
  const wiring = await call(lead, partsAndLegs.createLeg, {
    params,
    body: {
      partyId: tinder,
      partId: hilt.id,
      kind: 'wiring',
      title: 'Wire and fit',
      ...days,
      plannedStartOn: null,
      afterLegIds: [turning.id],
    },
  });
  const joint = await call(lead, joints.createJoint, {
    params,
    body: {
      name: 'Chassis in cavity',
      kind: 'chassis-in-cavity',
      holePartId: hilt.id,
      shaftPartId: chassis.id,
      holePartyId: aldgrove,
      shaftPartyId: tinder,
      nominalMm: 28,
      clearanceMinUm: 150,
      clearanceMaxUm: 400,
      holeClass: null,
      shaftClass: null,
      handFit: null,
      engagementMm: 120,
      hiddenLengthMm: 120,
      note: '',
    },
  });
  const handoff = await call(lead, handoffs.createHandoff, {
    params,
    body: {
      fromPartyId: aldgrove,
      toPartyId: tinder,
      partIds: [hilt.id],
      fromLegId: turning.id,
      toLegId: wiring.id,
      transitDays: 2,
      carriage: 'Courier',
    },
  });
  await call(lead, openThread, {
    params,
    body: { subject: 'commission', subjectId: commissionId, title: 'Makers', audience: 'makers', partyIds: [] },
  });
  await call(lead, openThread, {
    params,
    body: { subject: 'commission', subjectId: commissionId, title: 'With Orla', audience: 'everyone', partyIds: [] },
  });
  return { lead, maker, installer, client, commissionId, jointId: joint.id, handoffId: handoff.id };
}

/** Counts full page loads, so that "without a reload" is something that can fail. */
async function countLoads(page: Page): Promise<() => Promise<number>> {
  let loads = 0;
  page.on('load', () => (loads += 1));
  await page.evaluate(() => undefined);
  return () => Promise.resolve(loads);
}

test('a tight fit, a rework note with photographs, an agreed day, and one answer for the client, live in four browsers', async ({
  browser,
}) => {
  test.setTimeout(150_000);
  const [lead, maker, installer, client] = await Promise.all([
    signIn(browser, 'colm@colmferry.example'),
    signIn(browser, 'ines@aldgrove.example'),
    signIn(browser, 'sefa@tinderlane.example'),
    signIn(browser, 'orla@penhallow.example', { viewport: { width: 360, height: 780 } }),
  ]);
  const { commissionId, jointId, handoffId } = await makeWorld(lead, maker, installer, client);
  const base = `/commissions/${commissionId}`;

  // Everyone opens a page and stays on it.
  await Promise.all([
    lead.goto(base),
    maker.goto(`${base}/joints/${jointId}`),
    installer.goto(`${base}/joints/${jointId}`),
    client.goto(base),
  ]);
  await expect(client.getByTestId('headline')).toContainText('Between benches');
  await expect(maker.getByRole('button', { name: 'Raise the report' })).toBeVisible();
  await expect(installer.getByRole('heading', { name: 'Joint: Chassis in cavity' })).toBeVisible();
  const installerLoads = await countLoads(installer);
  const clientLoads = await countLoads(client);

  await test.step('the hilt maker measures, with the Enter of a caliper, in any unit', async () => {
    await maker.getByLabel('Which part').selectOption({ label: 'cavity' });
    await maker.getByLabel('Reading 1', { exact: true }).fill('28.04');
    await maker.getByLabel('Reading 1', { exact: true }).press('Enter');
    await expect(maker.getByLabel('Reading 2', { exact: true })).toBeFocused();
    await maker.keyboard.type('1.1035 in');
    await maker.getByRole('button', { name: 'Save 2 readings' }).click();
    await expect(maker.getByRole('cell', { name: '1.1035 in' })).toBeVisible();
    await maker.getByLabel('Which part').selectOption({ label: 'chassis' });
    await maker.getByLabel('Reading 1', { exact: true }).fill('28.01');
    await maker.getByLabel('Reading 2', { exact: true }).fill('28.02');
    await maker.getByRole('button', { name: 'Save 2 readings' }).click();
    await expect(maker.getByText('does not conform')).toBeVisible();
    // Worst pair: 1.1035 in = 28.0289 mm, less 28.02 mm; the middle of 150 to 400 is 275.
    await expect(maker.getByText('0.266 mm').first()).toBeVisible();
    await expect(installer.getByText('does not conform')).toBeVisible();
  });

  await test.step('and raises a report that holds the wiring; the others see it without a reload', async () => {
    await maker.getByLabel('What is wrong, in a few words').fill(SECRETS.report);
    await maker.getByLabel('Which leg it holds').selectOption({ label: 'Wire and fit' });
    await maker.getByRole('button', { name: 'Raise the report' }).click();
    await expect(maker.getByRole('heading', { name: `Fit report: ${SECRETS.report}` })).toBeVisible();
    await expect(installer.getByRole('link', { name: 'Open the report' })).toBeVisible();
    await expect(client.getByTestId('headline')).toContainText('Held at Tinder Lane Electrics');
    await expect(client.getByTestId('headline')).toContainText('a part does not yet go together as agreed');
  });

  await test.step('the lead releases words for the client, who reads them at once', async () => {
    await lead.getByRole('link', { name: SECRETS.report }).click();
    await lead.getByLabel("In the client's words").fill('The inner frame was too tight');
    await lead.getByRole('button', { name: 'Release these words' }).click();
    await expect(client.getByTestId('headline')).toContainText('the inner frame was too tight');
  });

  await test.step('the installer answers with a rework note and photographs', async () => {
    await installer.getByRole('link', { name: 'Open the report' }).click();
    const photograph = await sharp({ create: { width: 900, height: 600, channels: 3, background: '#7a5716' } })
      .jpeg()
      .toBuffer();
    await installer
      .getByLabel('Add pictures: before')
      .setInputFiles({ name: 'ring.jpg', mimeType: 'image/jpeg', buffer: photograph });
    await expect(maker.getByRole('img', { name: 'ring.jpg' })).toBeVisible();
    await installer.getByLabel('What will be done').fill(SECRETS.method);
    await installer.getByLabel('Cost, EUR').fill(SECRETS.cost);
    await installer.getByRole('button', { name: 'Answer with this rework note' }).click();
    await expect(maker.locator('p', { hasText: SECRETS.method })).toBeVisible();
    await maker.getByRole('button', { name: 'Agree to this rework' }).click();
    await expect(installer.getByRole('button', { name: 'Begin the rework' })).toBeVisible();
    await expect(client.getByTestId('headline')).toContainText('Nothing will show');
  });

  let agreed = addDays(new Date().toISOString().slice(0, 10), 12);
  while (!isWorkingDay(agreed)) agreed = addDays(agreed, 1);
  await test.step('both agree a handoff day, each seeing the other move', async () => {
    await Promise.all([maker.goto(`${base}/handoffs/${handoffId}`), installer.goto(`${base}/handoffs/${handoffId}`)]);
    await maker.getByLabel('Day', { exact: true }).fill(agreed);
    await expect(maker.getByText(/client's date/).first()).toBeVisible();
    await maker.getByRole('button', { name: 'Offer this day' }).click();
    await expect(installer.getByTestId('handoff-sides')).toContainText(`offers ${weekdayDayMonth(agreed)}`);
    await installer.getByRole('button', { name: `Accept ${shortDay(agreed)}` }).click();
    await expect(maker.getByText(`Agreed ${shortDay(agreed)}`, { exact: true })).toBeVisible();
    await expect(
      client.getByText(
        `Next agreed day: Hilt from Aldgrove Turning to Tinder Lane Electrics on ${weekdayDayMonth(agreed)}`,
      ),
    ).toBeVisible();
  });

  await test.step('makers talk among themselves, live, and the client hears nothing of it', async () => {
    await Promise.all([maker.goto(`${base}/threads`), installer.goto(`${base}/threads`)]);
    await maker.getByRole('link', { name: 'Makers' }).click();
    await installer.getByRole('link', { name: 'Makers' }).click();
    await expect(maker.getByText('Here now: Sefa Tindall')).toBeVisible();
    await maker.getByLabel('Write').fill(SECRETS.makers);
    await expect(installer.getByText('Ines Aldgrove is writing')).toBeVisible();
    await maker.getByRole('button', { name: 'Send' }).click();
    await expect(installer.getByTestId('thread-makers').getByText(SECRETS.makers)).toBeVisible();
  });

  await test.step('what the client must not see is nowhere on their page, nor behind it', async () => {
    const seen = await client.locator('body').innerText();
    for (const secret of [SECRETS.report, SECRETS.method, SECRETS.makers, '37.00']) expect(seen).not.toContain(secret);
    const reportId = new URL(lead.url()).pathname.split('/').at(-1) ?? '';
    expect((await tryCall(client, getFitReport, { params: { commissionId, reportId } })).status()).toBe(404);
    expect((await tryCall(client, joints.getJoint, { params: { commissionId, jointId } })).status()).toBe(404);
    const threads = await client.request.get(`/api/v1${base}/threads`);
    expect(await threads.text()).not.toContain('Makers');
  });
  expect(await clientLoads()).toBe(0);
  // The installer's own walk to another address is the one load there was.
  expect(await installerLoads()).toBeLessThanOrEqual(2);
});
