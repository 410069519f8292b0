/**
 * A name that one window of the browser holds at a time, as long as it lives. `claim` answers with what lets go of it,
 * or null while another window holds it.
 */
export type Claims = { claim: (name: string) => Promise<(() => void) | null> };

/** Claims by the browser's locks, which end with the window. */
export function lockClaims(locks: LockManager): Claims {
  return {
    claim: (name) =>
      new Promise((resolve, reject) => {
        locks
          .request(`stillpeg.${name}`, { ifAvailable: true }, (lock) => {
            if (!lock) {
              resolve(null);
              return;
            }
            return new Promise<void>((release) => resolve(release));
          })
          .catch(reject);
      }),
  };
}

const beat = 1_500;
const stale = 5_000;

/**
 * Claims for pages that have no locks, as on a local network without TLS: the holder writes the time into the shared
 * storage again and again, and a time that has grown old is nobody's. A window that closes lets go at once.
 */
export function beatingClaims(storage: Storage, newId: () => string): Claims {
  const me = newId();
  return {
    claim: async (name) => {
      const key = `stillpeg.holder.${name}`;
      const [holder, at] = (storage.getItem(key) ?? "").split(" ");
      if (holder && holder !== me && Date.now() - Number(at) < stale) return null;
      const write = () => storage.setItem(key, `${me} ${Date.now()}`);
      write();
      const timer = setInterval(write, beat);
      const release = () => {
        clearInterval(timer);
        removeEventListener("pagehide", release);
        if (storage.getItem(key)?.startsWith(`${me} `)) storage.removeItem(key);
      };
      addEventListener("pagehide", release);
      return release;
    },
  };
}

const windowKey = "stillpeg.window";
let ownWindow: Promise<string> | undefined;

/**
 * This window's id. A tab keeps it over a reload; where another tab holds it, because this one was duplicated from it,
 * it gets a new one.
 */
export function ownWindowId(claims: Claims, remembered: Storage, newId: () => string): Promise<string> {
  ownWindow ??= (async () => {
    const before = remembered.getItem(windowKey);
    const id = before !== null && (await claims.claim(before)) ? before : newId();
    if (id !== before) await claims.claim(id);
    remembered.setItem(windowKey, id);
    return id;
  })();
  return ownWindow;
}
