import { mkdirSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import {
  chromium,
  type Browser,
  type BrowserContext,
  type CDPSession,
  type Locator,
  type Page,
} from 'playwright-core';

const CHROMIUM = process.env.CHROMIUM ?? '/usr/bin/chromium';
const PICTURES = path.join(tmpdir(), 'elbowroom-journeys');

export type ScreenPoint = { readonly x: number; readonly y: number };

export type PersonOptions = {
  readonly name: string;
  readonly width: number;
  readonly height: number;
  readonly touch?: boolean;
  readonly scheme?: 'light' | 'dark';
};

/** One real Chromium for a file of journeys; every person gets a context of their own in it. */
export function launchBrowser(): Promise<Browser> {
  return chromium.launch({
    executablePath: CHROMIUM,
    args: ['--no-sandbox', '--disable-dev-shm-usage', '--disable-gpu'],
  });
}

/** Opens a window of a person's size on a server; nobody is signed in yet. */
export async function openPerson(
  browser: Browser,
  baseUrl: string,
  options: PersonOptions,
): Promise<JourneyPerson> {
  const context = await browser.newContext({
    baseURL: baseUrl,
    viewport: { width: options.width, height: options.height },
    hasTouch: options.touch ?? false,
    isMobile: (options.touch ?? false) && options.width < 700,
    colorScheme: options.scheme ?? 'light',
    locale: 'en-GB',
    timezoneId: 'UTC',
  });
  const page = await context.newPage();
  page.setDefaultTimeout(20_000);
  return new JourneyPerson(options, context, page, await context.newCDPSession(page));
}

/** Somebody in front of a window: what they do is done with real mouse, touch and key events. */
export class JourneyPerson {
  /** What went wrong inside the page; a journey ends with this list empty. */
  readonly errors: string[] = [];

  constructor(
    readonly options: PersonOptions,
    readonly context: BrowserContext,
    readonly page: Page,
    private readonly cdp: CDPSession,
  ) {
    page.on('pageerror', (error) => this.errors.push(error.message));
  }

  async goTo(route: string): Promise<void> {
    await this.page.goto(route, { waitUntil: 'load' });
  }

  /** Signs in through the screen, with the keyboard. */
  async signIn(email: string, password: string): Promise<void> {
    await this.goTo('/');
    await this.page.getByLabel('E-mail', { exact: false }).first().fill(email);
    const field = this.page.getByLabel('Password', { exact: false }).first();
    await field.fill(password);
    await field.press('Enter');
    await field.waitFor({ state: 'detached' });
  }

  /** Presses what carries a role and a name: by a tap where there is a touch screen, else by a click. */
  async press(
    role: 'button' | 'link' | 'tab' | 'radio' | 'menuitem' | 'checkbox',
    name: string | RegExp,
  ): Promise<void> {
    await this.pressOn(this.page.getByRole(role, { name }).filter({ visible: true }).first());
  }

  async pressOn(locator: Locator): Promise<void> {
    if (this.options.touch) await locator.tap();
    else await locator.click();
  }

  /** Puts one finger down, moves it in steps and lifts it; `onStep` runs between two moves, with the finger down. */
  async dragByTouch(
    from: ScreenPoint,
    to: ScreenPoint,
    steps = 12,
    onStep?: (step: number) => Promise<void>,
  ): Promise<void> {
    await this.touchDown(from);
    for (let step = 1; step <= steps; step += 1) {
      const t = step / steps;
      await this.touchMove({ x: from.x + (to.x - from.x) * t, y: from.y + (to.y - from.y) * t });
      await onStep?.(step);
    }
    await this.touchUp();
  }

  async touchDown(point: ScreenPoint): Promise<void> {
    await this.cdp.send('Input.dispatchTouchEvent', {
      type: 'touchStart',
      touchPoints: [{ ...point, id: 1 }],
    });
  }

  async touchMove(point: ScreenPoint): Promise<void> {
    await this.cdp.send('Input.dispatchTouchEvent', {
      type: 'touchMove',
      touchPoints: [{ ...point, id: 1 }],
    });
    // One frame: the drawing coalesces moves to frames, so a finger that outruns them would not be seen.
    await this.page.evaluate(() => new Promise((resolve) => requestAnimationFrame(resolve)));
  }

  async touchUp(): Promise<void> {
    await this.cdp.send('Input.dispatchTouchEvent', { type: 'touchEnd', touchPoints: [] });
  }

  /** Waits until the page says this; the text is looked for where somebody can see it. */
  async sees(text: string | RegExp): Promise<void> {
    await this.page.getByText(text).filter({ visible: true }).first().waitFor();
  }

  /** A picture of the window in the system's temporary folder, for looking at. */
  async picture(name: string): Promise<void> {
    mkdirSync(PICTURES, { recursive: true });
    await this.page.evaluate(() => document.fonts.ready);
    await this.page.screenshot({ path: path.join(PICTURES, `${name}.png`) });
  }

  async close(): Promise<void> {
    await this.context.close();
  }
}
