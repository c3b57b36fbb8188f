/** Why a mail did not get through, told apart by what to do about it. */
export type FaultKind = 'unreachable' | 'temporary' | 'permanent';

export class DeliveryFault extends Error {
  constructor(
    readonly kind: FaultKind,
    /** True where the server itself said no, so that it surely has not kept the mail. */
    readonly isAnswered: boolean,
    /** For the queue page: no address and nothing of the mail. */
    readonly words: string,
  ) {
    super(words);
  }
}

interface SmtpError {
  code?: string;
  originalCode?: string;
  command?: string;
  responseCode?: number;
}

/** Only a refusal of this recipient or this mail is for good; one of the sender or the session is the server's state. */
export function asDeliveryFault(error: unknown): DeliveryFault {
  if (error instanceof DeliveryFault) return error;
  const { code, originalCode, command, responseCode } = (error ?? {}) as SmtpError;
  const isOfMail = command === 'RCPT TO' || command === 'DATA';
  if (responseCode && isOfMail && responseCode >= 500)
    return new DeliveryFault('permanent', true, `The mail server refused it for good (${responseCode} at ${command}).`);
  if (responseCode && (isOfMail || command === 'MAIL FROM'))
    return new DeliveryFault('temporary', true, `The mail server refused it for now (${responseCode} at ${command}).`);
  if (responseCode) return new DeliveryFault('unreachable', true, `The mail server takes nothing now (${responseCode}).`);
  return new DeliveryFault('unreachable', false, `The mail server can not be reached (${originalCode ?? code ?? 'no answer'}).`);
}
