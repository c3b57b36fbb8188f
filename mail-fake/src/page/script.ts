/** The page's script, served as a file: the policy allows no inline script. */
export const SCRIPT = `'use strict';

const failure = document.getElementById('failure');

async function send(method, path, body) {
  failure.hidden = true;
  try {
    const response = await fetch(path, {
      method,
      headers: body ? { 'Content-Type': 'application/json' } : {},
      body: body ? JSON.stringify(body) : undefined,
    });
    if (response.ok) {
      return response;
    }
    const problem = await response.json();
    failure.textContent = problem.title + '. ' + problem.detail;
  } catch {
    failure.textContent = 'The server does not answer. Is it still running?';
  }
  failure.hidden = false;
  return null;
}

document.getElementById('delete-all')?.addEventListener('click', async () => {
  if (confirm('Delete all messages that were caught?') && (await send('DELETE', '/api/messages'))) {
    location.assign('/');
  }
});

document.getElementById('behaviour')?.addEventListener('submit', async (event) => {
  event.preventDefault();
  const fields = new FormData(event.target);
  const response = await send('PUT', '/api/behaviour', {
    mode: fields.get('mode'),
    at: fields.get('at'),
    code: Number(fields.get('code')),
    delayMs: Number(fields.get('delayMs')),
  });
  if (response) {
    const { mode } = await response.json();
    document.getElementById('behaviour-state').textContent = 'Now: ' + mode;
  }
});
`;
