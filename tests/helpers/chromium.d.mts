/** Path of a Chromium, undefined where there is none. */
export function findChromium(): string | undefined
/** Path of a Chromium; installs Debian's package as root; ends the process without one. */
export function ensureChromium(): string
