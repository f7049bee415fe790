/**
 * A real browser for the tests: the system's Chromium where there is one, else the one inside an npm package, else a reason.
 * Nothing is fetched at test time.
 */
import { existsSync } from 'node:fs';
import { type Browser, type BrowserContext, type BrowserContextOptions, chromium, type Page } from 'playwright-core';

const SYSTEM = ['/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome'];
const FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

export interface Launched {
  readonly name: string;
  readonly browser: Browser;
}

/** Every browser that starts here, the system's first; and why others do not. */
export async function launchAll(): Promise<{
  readonly started: readonly Launched[];
  readonly reasons: readonly string[];
}> {
  const started: Launched[] = [];
  const reasons: string[] = [];
  for (const [name, launch] of [
    ['system Chromium', launchSystem],
    ['packaged Chromium', launchPackaged],
  ] as const) {
    try {
      started.push({ name, browser: await launch() });
    } catch (error) {
      reasons.push(`${name}: ${error instanceof Error ? error.message.split('\n')[0] : String(error)}`);
    }
  }
  return { started, reasons };
}

function launchSystem(): Promise<Browser> {
  const executablePath = SYSTEM.find((path) => existsSync(path));
  if (executablePath === undefined) throw new Error('not installed');
  return chromium.launch({ executablePath, args: FLAGS });
}

async function launchPackaged(): Promise<Browser> {
  const { default: packaged } = await import('@sparticuz/chromium');
  const executablePath = await packaged.executablePath();
  return chromium.launch({
    executablePath,
    args: [...new Set([...packaged.args, ...FLAGS])],
    env: definedEnvironment(),
  });
}

/** The environment as the package has completed it (it adds its own libraries to LD_LIBRARY_PATH). */
function definedEnvironment(): Record<string, string> {
  return Object.fromEntries(
    Object.entries(process.env).flatMap(([name, value]) => (value === undefined ? [] : [[name, value]])),
  );
}

/** Text of one element, hidden parts too. */
export async function textOf(page: Page, selector: string): Promise<string> {
  return (await page.locator(selector).textContent()) ?? '';
}

/** A tab on `address` and everything it complains about, page errors and refused loads too. */
export async function openTab(
  browser: Browser,
  address: string,
  options: BrowserContextOptions = {},
): Promise<{ readonly page: Page; readonly context: BrowserContext; readonly complaints: string[] }> {
  const context = await browser.newContext({
    viewport: { width: 1280, height: 720 },
    acceptDownloads: true,
    ...options,
  });
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on('console', (message) => complaints.push(`${message.type()}: ${message.text()}`));
  page.on('pageerror', (error) => complaints.push(`error: ${error.message}`));
  page.on('request', (request) => {
    if (!/^(file|blob|data|about):/.test(request.url())) complaints.push(`asked for ${request.url()}`);
  });
  await page.goto(address);
  await page.waitForSelector('html[data-live="yes"]');
  return { page, context, complaints };
}
