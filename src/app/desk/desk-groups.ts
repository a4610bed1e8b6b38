import type * as z from 'zod';
import { DESK_GROUPS, type DeskItem } from '../../../shared/contract/desk.ts';
import type { IconName } from '../ui/icon-outlines.ts';

export type Item = z.infer<typeof DeskItem>;
export type DeskGroupKind = (typeof DESK_GROUPS)[number];

/** How a group is headed and what its rows lead to. */
export interface GroupWords {
  readonly icon: IconName;
  readonly heading: string;
  readonly remark: string;
  readonly act: string;
  /** Last segment of the page the act opens; empty for the stage sheet. */
  readonly page: '' | 'check' | 'lock';
  /** What the note of an item is: what it is about, or how far it has come. */
  readonly noteTells: 'subject' | 'progress';
}

export interface ShownGroup extends GroupWords {
  readonly items: readonly Item[];
}

export const GROUPS: Record<DeskGroupKind, GroupWords> = {
  'to-check': {
    icon: 'search-check',
    heading: 'To check',
    remark: 'You are not the designer of any of these',
    act: 'Start check',
    page: 'check',
    noteTells: 'progress',
  },
  'to-approve': {
    icon: 'lock',
    heading: 'To approve',
    remark: 'You neither designed nor checked any of these',
    act: 'Read and lock',
    page: 'lock',
    noteTells: 'subject',
  },
  'findings-to-answer': {
    icon: 'message',
    heading: 'Findings to answer',
    remark: 'Raised by the checker',
    act: 'Answer',
    page: 'check',
    noteTells: 'subject',
  },
  'findings-to-close': {
    icon: 'message',
    heading: 'Findings answered, to close',
    remark: 'Answered by the designer',
    act: 'Read answer',
    page: 'check',
    noteTells: 'subject',
  },
  'part-data-changed': {
    icon: 'flag',
    heading: 'Part data changed since lock',
    remark: 'The locked record stays as it was',
    act: 'Open',
    page: '',
    noteTells: 'subject',
  },
  'own-drafts': {
    icon: 'pen',
    heading: 'My own drafts',
    remark: 'Another person will check these',
    act: 'Open',
    page: '',
    noteTells: 'subject',
  },
};

export const OTHERS_GROUP: GroupWords = {
  icon: 'history',
  heading: 'I wait for others',
  remark: 'Submitted by you',
  act: 'Open',
  page: '',
  noteTells: 'subject',
};
