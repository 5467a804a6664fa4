const key = 'wetside.last-darkroom';

/** Which darkroom this device was at last; nothing where storage is closed. */
export function lastDarkroom(): string | null {
  try {
    return localStorage.getItem(key);
  } catch {
    return null;
  }
}

export function rememberDarkroom(darkroom: string): void {
  try {
    localStorage.setItem(key, darkroom);
  } catch {
    // A device that stores nothing simply asks again.
  }
}
