import type { Browser } from 'playwright-core';
import type { Setup } from '@/shared/api/session';
import { launchBrowser, openPerson } from '../support/journey-person';
import {
  makeDataFolder,
  removeDataFolder,
  spawnServer,
  type SpawnedProcess,
} from '../support/spawned-server';

let folder: string;
let server: SpawnedProcess;
let browser: Browser;
let url: string;
let accounts: Setup['demoAccounts'];

// The client is built here when no built one is named: that takes a minute or two on two cores.
beforeAll(async () => {
  folder = makeDataFolder();
  server = spawnServer(folder, { ELBOWROOM_CLIENT: process.env.ELBOWROOM_CLIENT ?? 'build' });
  url = await server.ready;
  browser = await launchBrowser();
  accounts = ((await (await fetch(`${url}/api/setup`)).json()) as Setup).demoAccounts;
}, 400_000);

afterAll(async () => {
  await browser?.close();
  server?.child.kill('SIGTERM');
  await server?.exit;
  removeDataFolder(folder);
}, 60_000);

function accountOf(role: string) {
  return accounts.find(({ email }) => email.startsWith(role))!;
}

test('an integrator goes from the sign-in to the van and sees what lacks', async () => {
  const person = await openPerson(browser, url, {
    name: 'integrator',
    width: 1024,
    height: 768,
    touch: true,
  });
  const { email, password } = accountOf('integrator');
  await person.page.goto('/sign-in');
  await person.page.getByLabel('E-mail', { exact: true }).fill(email);
  await person.page.getByLabel('Password', { exact: true }).fill(password);
  await person.page.getByLabel('Password', { exact: true }).press('Enter');
  await person.page.getByRole('link', { name: /^Patrol van/ }).click();
  await person.page.getByRole('link', { name: 'Open Layout 1' }).click();
  await person.page.getByTestId('plan').waitFor();
  await person.page.getByRole('heading', { name: /A2 into A3 lacks/ }).waitFor();
  await person.close();
}, 120_000);

test('an installer begins at the frozen revisions and opens one', async () => {
  const person = await openPerson(browser, url, { name: 'installer', width: 390, height: 844, touch: true });
  const { email, password } = accountOf('installer');
  await person.page.goto('/sign-in');
  await person.page.getByLabel('E-mail', { exact: true }).fill(email);
  await person.page.getByLabel('Password', { exact: true }).fill(password);
  await person.page.getByLabel('Password', { exact: true }).press('Enter');
  await person.page.getByRole('link', { name: /Harbour office/ }).click();
  await person.page.getByRole('heading', { name: 'Positions' }).waitFor();
  await person.page.getByText('This is the one to build from').waitFor();
  await person.close();
}, 120_000);
