import type { Problem } from '@bookmatch/common/problems/problem';

/** How the saving of one form stands. Reset when the form is opened, so that it never shows an old outcome. */
export type SaveState = { status: 'idle' | 'saving' | 'saved' | 'failed'; problem: Problem | null };

export const notSaved: SaveState = { status: 'idle', problem: null };
export const saving: SaveState = { status: 'saving', problem: null };
export const saved: SaveState = { status: 'saved', problem: null };
export const saveFailed = (problem: Problem): SaveState => ({ status: 'failed', problem });
