/** True when the address answers with a status that `accept` takes; false when nobody is there yet. */
export async function answers(url, accept = (status) => status < 500) {
  try {
    const response = await fetch(url, { signal: AbortSignal.timeout(5000) });
    await response.arrayBuffer();
    return accept(response.status);
  } catch {
    return false;
  }
}
