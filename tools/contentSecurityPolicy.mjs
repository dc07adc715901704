/**
 * The content security policy: nothing is loaded from, or sent to, another origin.
 * It must be a response header on every file: a policy in a <meta> tag does not bind the worker, which obeys the
 * header its own script came with. README.md shows the same string for hosting elsewhere.
 */
const DIRECTIVES = {
  'default-src': "'none'",
  // HiGHS is WebAssembly; this allows compiling it, and no eval of text.
  'script-src': "'self' 'wasm-unsafe-eval'",
  'style-src': "'self'",
  'img-src': "'self' data: blob:",
  'font-src': "'self'",
  'connect-src': "'self'",
  'worker-src': "'self'",
  'manifest-src': "'self'",
  'base-uri': "'none'",
  'form-action': "'none'",
  'frame-ancestors': "'none'",
};

export const CONTENT_SECURITY_POLICY = Object.entries(DIRECTIVES)
  .map(([directive, sources]) => `${directive} ${sources}`)
  .join('; ');

/** The headers that every response carries, 404 included. */
export const SECURITY_HEADERS = {
  'Content-Security-Policy': CONTENT_SECURITY_POLICY,
  'X-Content-Type-Options': 'nosniff',
  'Referrer-Policy': 'no-referrer',
  'Cross-Origin-Opener-Policy': 'same-origin',
};
