import { asDeliveryFault } from './delivery-fault.js';
import { pauseAfter } from './outbox-sender.service.js';

const HOUR = 3_600_000;

describe('pauses between tries', () => {
  it('double from five seconds up to the longest', () => {
    const half = [1, 2, 3, 4, 20].map((attempts) => pauseAfter(attempts, HOUR, 0.5));
    expect(half).toEqual([5000, 10_000, 20_000, 40_000, HOUR]);
  });

  it('differ by at most a fifth', () => {
    expect(pauseAfter(1, HOUR, 0)).toBe(4000);
    expect(pauseAfter(1, HOUR, 1)).toBe(6000);
  });
});

describe('what a refusal means (RFC 5321, 4.2.1: 4yz may be tried again, 5yz not)', () => {
  it.each([
    [{ command: 'RCPT TO', responseCode: 550 }, 'permanent', true],
    [{ command: 'DATA', responseCode: 554 }, 'permanent', true],
    [{ command: 'RCPT TO', responseCode: 451 }, 'temporary', true],
    [{ command: 'DATA', responseCode: 452 }, 'temporary', true],
    // of the sender or the session, not of this mail: somebody will mend the server
    [{ command: 'MAIL FROM', responseCode: 550 }, 'temporary', true],
    [{ command: 'CONN', responseCode: 554 }, 'unreachable', true],
    [{ code: 'ESOCKET', originalCode: 'ECONNREFUSED' }, 'unreachable', false],
    [{ code: 'ECONNECTION' }, 'unreachable', false],
  ])('%j is %s', (error, kind, isAnswered) => {
    expect(asDeliveryFault(error)).toMatchObject({ kind, isAnswered });
  });

  it('tells nothing of the address or the mail', () => {
    const error = Object.assign(new Error('550 no <ada@k.example> here'), { command: 'RCPT TO', responseCode: 550, response: '550 no <ada@k.example> here' });
    expect(asDeliveryFault(error).words).toBe('The mail server refused it for good (550 at RCPT TO).');
  });
});
