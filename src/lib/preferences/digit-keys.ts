import { createPreference } from './preference.ts';

/** Whether 1, 2, 3 and 0 go to the stations and the Season. */
export const digitKeys = createPreference<'on' | 'off'>('digit-keys', ['on', 'off'], 'on');
