'use client';

import { useQuery, type QueryClient } from '@tanstack/react-query';
import { sessionAnswer } from '@/lib/auth/schema';
import { callApi } from '@/lib/platform/http/call-api';

export const SESSION_KEY = ['session'];

/** Who is signed in, asked by the browser: pages are the same for everybody. */
export function useSession() {
  return useQuery({
    queryKey: SESSION_KEY,
    queryFn: () => callApi('/api/v1/session', { answer: sessionAnswer }),
  });
}

/** Signs out on the server, and forgets here what belonged to the member. */
export async function signOut(client: QueryClient): Promise<void> {
  await callApi('/api/v1/session', { method: 'DELETE', answer: sessionAnswer });
  client.clear();
  for (const key of Object.keys(localStorage)) {
    if (key.startsWith('wattcairn-') && key !== 'wattcairn-theme') localStorage.removeItem(key);
  }
}
