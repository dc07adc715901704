import type { Page } from '@playwright/test';

const OWN_SCHEMES = new Set(['data:', 'blob:', 'about:']);

/** Whether a request stays with the app: its own origin, or an address that holds its own content. */
export function staysHome(address: string, origin: string): boolean {
  const url = new URL(address);
  return url.origin === origin || OWN_SCHEMES.has(url.protocol);
}

/** Collects what a quiet page never does: errors, warnings, policy violations, requests to another origin. */
export async function watchPage(page: Page, origin: string): Promise<() => string[]> {
  const complaints: string[] = [];
  page.on('console', (message) => {
    if (message.type() === 'error' || message.type() === 'warning') complaints.push(`console: ${message.text()}`);
  });
  page.on('pageerror', (error) => complaints.push(`page error: ${error.message}`));
  page.on('websocket', (socket) => complaints.push(`web socket: ${socket.url()}`));
  page.context().on('request', (request) => {
    if (!staysHome(request.url(), origin)) complaints.push(`another origin: ${request.url()}`);
  });
  await page.addInitScript(() => {
    document.addEventListener('securitypolicyviolation', (event) => {
      console.error(`policy violation: ${event.violatedDirective} ${event.blockedURI}`);
    });
  });
  return () => complaints;
}
