/** What the rest of the application may use of this slice. */
export { sessionRenewal } from './sign-in-again/session-renewal';
export { HOME_ZONES, otherZones } from './sign-up/time-zones';
