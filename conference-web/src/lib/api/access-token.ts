/** The access token lives in this tab's memory only: it is gone with the tab, and no other page can read it. */
let current: { token: string; expiresAt: number } | null = null;

export const getAccessToken = (): string | null => current?.token ?? null;

/** False in the last seconds, so that a request does not start with a token that ends on the way. */
export const hasLiveAccessToken = (): boolean => current !== null && current.expiresAt - Date.now() > 5_000;

export function setAccessToken(token: string, expiresInSeconds: number): void {
  current = { token, expiresAt: Date.now() + expiresInSeconds * 1000 };
}

export function clearAccessToken(): void {
  current = null;
}
