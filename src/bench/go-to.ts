import { goto } from '$app/navigation';

/** Goes to a page of the app; the empty path is the bench. */
export function goTo(path: string): void {
  void goto(`#/${path}`);
}
