import { waitingText } from '../ui/time-text.ts';
import type { Item } from './desk-groups.ts';

const WORDS = [
  'No',
  'One',
  'Two',
  'Three',
  'Four',
  'Five',
  'Six',
  'Seven',
  'Eight',
  'Nine',
  'Ten',
  'Eleven',
  'Twelve',
];

/** `Seven things wait for you. The oldest has waited 3 days.` */
export function deskHeadline(items: readonly Pick<Item, 'sinceMs'>[], nowMs: number): string {
  if (items.length === 0) return 'Nothing waits for you.';
  const count = WORDS[items.length] ?? String(items.length);
  const wait = items.length === 1 ? 'thing waits' : 'things wait';
  const oldest = waitingText(Math.min(...items.map((item) => item.sinceMs)), nowMs);
  const since = oldest === 'now' ? '' : ` The oldest has waited ${oldest}.`;
  return `${count} ${wait} for you.${items.length === 1 ? since.replace('The oldest', 'It') : since}`;
}
