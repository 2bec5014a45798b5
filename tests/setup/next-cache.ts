import { vi } from 'vitest';

/** Tags that handlers dropped: outside of Next there is no cache to drop them from. */
export const droppedTags: string[] = [];

vi.mock('next/cache', () => ({ revalidateTag: (tag: string) => void droppedTags.push(tag) }));
