/** The database of this browser in which unsent work is kept. */
export const DEVICE_DATABASE = 'vatwright';

/** Erases all that was kept on this device: private work must not outlive the sign-out. */
export function forgetDevice(): void {
  if (typeof indexedDB !== 'undefined') indexedDB.deleteDatabase(DEVICE_DATABASE);
}
