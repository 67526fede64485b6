/**
 * What the page may load and whom it may talk to: its own origin and nobody else.
 * The one place this is decided. The build writes it into index.html as <meta> and into dist/headers.json for whoever
 * serves the files; the service worker adds it to all it serves (a <meta> policy does not bind web workers, a header does).
 */

/**
 * The two <style> elements react-aria 3.53.1 puts into the page, by the SHA-256 of their text (usePress, usePreventScroll).
 * A test computes them from the installed package, so a changed text is found there and not on a ward.
 */
const REACT_ARIA_STYLES = [
  "'sha256-38RhXrc7EdReTKsOm23ZPOCUgniTUUcjky8QOOrQx6o='",
  "'sha256-gYiS/BvZvRcK27JIXTuwhZ3hs2+VJ1X+2gUlE+farlg='",
] as const;

type Directives = Readonly<Record<string, readonly string[]>>;

const DIRECTIVES: Directives = {
  "default-src": ["'none'"],
  "script-src": ["'self'"],
  "worker-src": ["'self'"],
  "style-src": ["'self'", ...REACT_ARIA_STYLES],
  "img-src": ["'self'", "blob:", "data:"],
  "font-src": ["'self'"],
  "connect-src": ["'self'"],
  "manifest-src": ["'self'"],
  "base-uri": ["'none'"],
  "form-action": ["'none'"],
};

/** The policy for a <meta> element. `frame-ancestors` is left out: browsers ignore it there and complain. */
export const META_POLICY = policyText(DIRECTIVES);

export const HEADER_POLICY = policyText({ ...DIRECTIVES, "frame-ancestors": ["'none'"] });

/** For `vite dev` only: its page carries inline scripts and styles and a web socket. Still no foreign origin. */
export const DEVELOPMENT_POLICY = policyText({
  ...DIRECTIVES,
  "script-src": ["'self'", "'unsafe-inline'"],
  "style-src": ["'self'", "'unsafe-inline'"],
  "font-src": ["'self'", "data:"],
  "connect-src": ["'self'", "ws:"],
  "frame-ancestors": ["'none'"],
});

const SHUT_FEATURES = [
  "accelerometer",
  "autoplay",
  "camera",
  "display-capture",
  "geolocation",
  "gyroscope",
  "hid",
  "magnetometer",
  "microphone",
  "midi",
  "payment",
  "publickey-credentials-get",
  "screen-wake-lock",
  "serial",
  "usb",
  "xr-spatial-tracking",
];

/** Sent with every response, whoever answers it. */
export const SECURITY_HEADERS: Readonly<Record<string, string>> = {
  "Content-Security-Policy": HEADER_POLICY,
  "Referrer-Policy": "no-referrer",
  "Permissions-Policy": SHUT_FEATURES.map((feature) => `${feature}=()`).join(", "),
  "Cross-Origin-Opener-Policy": "same-origin",
  "Cross-Origin-Resource-Policy": "same-origin",
  "X-Content-Type-Options": "nosniff",
};

function policyText(directives: Directives): string {
  return Object.entries(directives)
    .map(([name, sources]) => `${name} ${sources.join(" ")}`)
    .join("; ");
}
