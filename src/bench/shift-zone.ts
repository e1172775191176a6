import { zoneOffset } from '../device/zone-offset.ts';

/** Of the tablet's zone, at any instant: shift hours are hours on its clock, also in the night when they change. */
export const offsetMinutesAt = zoneOffset();
