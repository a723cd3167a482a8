/// <reference types="astro/client" />

declare namespace App {
  interface Locals {
    /** The person signed in, at the plant of the session; null where nobody is. */
    actor: import('./server/auth/actor').Actor | null;
    /** The session's id as in the cookie; null where nobody is signed in. */
    sessionId: string | null;
    /** As chosen and kept in a cookie; `system` follows the device. */
    theme: 'light' | 'dark' | 'system';
    /** The person's choice, else the plant's. */
    units: import('./core/quantity/display').UnitSystem;
    /** Where the person may work, by name. */
    plants: readonly { readonly plantId: string; readonly plantName: string }[];
  }
}
