import { useSyncExternalStore } from 'react';

const never = () => () => {};

/** False in the server's HTML and until the script runs: what only a script can operate is no tab stop before. */
export function useScripted(): boolean {
  return useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
}
