export const READING_STATES = ['waits', 'read', 'failed'] as const;
export type ReadingState = (typeof READING_STATES)[number];
