import { timingSafeEqual } from 'node:crypto';
import { S3Error } from './errors.js';
import {
  canonicalRequest,
  hmac,
  scopeText,
  signingKey,
  stringToSign,
  type QueryPair,
  type SigningScope,
} from './signature.js';

export interface Credentials {
  accessKeyId: string;
  secretAccessKey: string;
  region: string;
}

export interface SignedRequest {
  method: string;
  rawPath: string;
  query: readonly QueryPair[];
  headers: Readonly<Record<string, readonly string[] | undefined>>;
}

/** What later steps need of a checked signature: the body's hash and the start of the chunk signatures. */
export interface Authenticated {
  presigned: boolean;
  payloadHash: string;
  timestamp: string;
  scope: string;
  key: Buffer;
  signature: string;
}

interface Claim {
  presigned: boolean;
  credential: string;
  signedHeaders: string[];
  signature: string;
  timestamp: string;
  payloadHash: string;
  query: readonly QueryPair[];
}

const ALGORITHM = 'AWS4-HMAC-SHA256';
const MAX_SKEW_MS = 15 * 60 * 1000;
const MAX_EXPIRES_SECONDS = 7 * 24 * 3600;
const STREAMING = /^STREAMING-(?:UNSIGNED-PAYLOAD-TRAILER|AWS4-HMAC-SHA256-PAYLOAD(?:-TRAILER)?)$/;

/** Checks who sent a request and that nobody changed it; throws S3's refusal otherwise. */
export function authenticate(request: SignedRequest, credentials: Credentials, now: Date): Authenticated {
  const authorization = request.headers['authorization']?.[0];
  const inQuery = queryValue(request.query, 'X-Amz-Signature') ?? queryValue(request.query, 'X-Amz-Algorithm');
  if (authorization === undefined && inQuery === undefined) throw new S3Error('AccessDenied');
  if (authorization !== undefined && inQuery !== undefined) {
    throw new S3Error('InvalidArgument', 'Only one auth mechanism allowed');
  }
  const claim = authorization === undefined ? claimFromQuery(request) : claimFromHeader(request, authorization);
  const scope = checkedScope(claim, credentials);
  if (claim.presigned) checkExpiry(request, claim.timestamp, now);
  else checkSkew(claim.timestamp, now);
  checkSignedHeaders(request, claim);
  return checkSignature(request, claim, scope, credentials);
}

function claimFromHeader(request: SignedRequest, authorization: string): Claim {
  const match = /^AWS4-HMAC-SHA256\s+(.*)$/.exec(authorization);
  if (match === null) throw new S3Error('InvalidRequest', `Please use ${ALGORITHM}`);
  const fields = new Map<string, string>();
  for (const field of (match[1] ?? '').split(',')) {
    const at = field.indexOf('=');
    fields.set(field.slice(0, at).trim(), field.slice(at + 1).trim());
  }
  const [credential, signedHeaders, signature] = ['Credential', 'SignedHeaders', 'Signature'].map((name) =>
    fields.get(name),
  );
  if (!credential || !signedHeaders || !signature) throw new S3Error('AuthorizationHeaderMalformed');
  const payloadHash = request.headers['x-amz-content-sha256']?.[0];
  if (payloadHash === undefined) {
    throw new S3Error('InvalidRequest', 'Missing required header for this request: x-amz-content-sha256');
  }
  if (!/^[0-9a-f]{64}$/.test(payloadHash) && payloadHash !== 'UNSIGNED-PAYLOAD' && !STREAMING.test(payloadHash)) {
    throw new S3Error('InvalidArgument', 'x-amz-content-sha256 must be UNSIGNED-PAYLOAD, or a valid sha256 value.');
  }
  return {
    presigned: false,
    credential,
    signedHeaders: signedHeaders.split(';'),
    signature,
    timestamp: requestTimestamp(request),
    payloadHash,
    query: request.query,
  };
}

function requestTimestamp(request: SignedRequest): string {
  const own = request.headers['x-amz-date']?.[0];
  if (own !== undefined) return own;
  const date = new Date(request.headers['date']?.[0] ?? '');
  if (Number.isNaN(date.getTime())) {
    throw new S3Error('AccessDenied', 'AWS authentication requires a valid Date or x-amz-date header');
  }
  return date.toISOString().replace(/[-:]|\.\d{3}/g, '');
}

function claimFromQuery(request: SignedRequest): Claim {
  const need = (name: string): string => {
    const value = queryValue(request.query, name);
    if (!value) throw new S3Error('AuthorizationQueryParametersError', `Query-string authentication requires ${name}`);
    return value;
  };
  if (need('X-Amz-Algorithm') !== ALGORITHM) {
    throw new S3Error('AuthorizationQueryParametersError', `X-Amz-Algorithm only supports "${ALGORITHM}"`);
  }
  const expires = need('X-Amz-Expires');
  if (!/^\d{1,9}$/.test(expires) || Number(expires) < 1 || Number(expires) > MAX_EXPIRES_SECONDS) {
    throw new S3Error('AuthorizationQueryParametersError', 'X-Amz-Expires must be from 1 to 604800 seconds');
  }
  const signedHeaders = need('X-Amz-SignedHeaders').split(';');
  const hashInHeader = signedHeaders.includes('x-amz-content-sha256')
    ? request.headers['x-amz-content-sha256']?.[0]
    : undefined;
  return {
    presigned: true,
    credential: need('X-Amz-Credential'),
    signedHeaders,
    signature: need('X-Amz-Signature'),
    timestamp: need('X-Amz-Date'),
    payloadHash: queryValue(request.query, 'X-Amz-Content-Sha256') ?? hashInHeader ?? 'UNSIGNED-PAYLOAD',
    query: request.query.filter(([name]) => name !== 'X-Amz-Signature'),
  };
}

function checkedScope(claim: Claim, credentials: Credentials): SigningScope {
  const malformed = claim.presigned ? 'AuthorizationQueryParametersError' : 'AuthorizationHeaderMalformed';
  const [accessKeyId, date, region, service, terminator, ...rest] = claim.credential.split('/');
  if (accessKeyId !== credentials.accessKeyId) throw new S3Error('InvalidAccessKeyId');
  if (rest.length > 0 || terminator !== 'aws4_request' || service !== 's3' || date !== claim.timestamp.slice(0, 8)) {
    throw new S3Error(malformed, 'The credential must be <access key>/<date of the request>/<region>/s3/aws4_request');
  }
  if (region !== credentials.region) {
    throw new S3Error(malformed, `The region '${region}' is wrong; expecting '${credentials.region}'`, {
      Region: credentials.region,
    });
  }
  return { date, region, service };
}

function timeOf(timestamp: string): number {
  const match = /^(\d{4})(\d\d)(\d\d)T(\d\d)(\d\d)(\d\d)Z$/.exec(timestamp);
  const [, year, month, day, hour, minute, second] = match ?? [];
  const time = Date.parse(`${year}-${month}-${day}T${hour}:${minute}:${second}Z`);
  if (Number.isNaN(time)) throw new S3Error('AccessDenied', 'The date must have the form YYYYMMDDTHHMMSSZ');
  return time;
}

function checkSkew(timestamp: string, now: Date): void {
  if (Math.abs(now.getTime() - timeOf(timestamp)) <= MAX_SKEW_MS) return;
  throw new S3Error('RequestTimeTooSkewed', undefined, {
    RequestTime: timestamp,
    ServerTime: now.toISOString(),
    MaxAllowedSkewMilliseconds: String(MAX_SKEW_MS),
  });
}

function checkExpiry(request: SignedRequest, timestamp: string, now: Date): void {
  const signedAt = timeOf(timestamp);
  if (signedAt > now.getTime() + MAX_SKEW_MS) throw new S3Error('AccessDenied', 'Request is not yet valid');
  const seconds = Number(queryValue(request.query, 'X-Amz-Expires'));
  const end = signedAt + seconds * 1000;
  if (now.getTime() < end) return;
  throw new S3Error('AccessDenied', 'Request has expired', {
    'X-Amz-Expires': String(seconds),
    Expires: new Date(end).toISOString(),
    ServerTime: now.toISOString(),
  });
}

// An unsigned x-amz-* header could change what a signed request does, so each must be signed.
function checkSignedHeaders(request: SignedRequest, claim: Claim): void {
  const signed = new Set(claim.signedHeaders);
  const unsigned = Object.keys(request.headers).filter(
    (name) => name.startsWith('x-amz-') && name !== 'x-amz-content-sha256' && !signed.has(name),
  );
  if (!signed.has('host')) unsigned.push('host');
  if (unsigned.length === 0) return;
  throw new S3Error('AccessDenied', 'There were headers present in the request which were not signed', {
    HeadersNotSigned: unsigned.join(', '),
  });
}

function checkSignature(
  request: SignedRequest,
  claim: Claim,
  scope: SigningScope,
  credentials: Credentials,
): Authenticated {
  const canonical = canonicalRequest({
    method: request.method,
    rawPath: request.rawPath,
    query: claim.query,
    headers: request.headers,
    signedHeaders: claim.signedHeaders,
    payloadHash: claim.payloadHash,
  });
  const text = stringToSign(claim.timestamp, scope, canonical);
  const key = signingKey(credentials.secretAccessKey, scope);
  if (!signaturesMatch(hmac(key, text).toString('hex'), claim.signature)) {
    throw new S3Error('SignatureDoesNotMatch', undefined, {
      AWSAccessKeyId: credentials.accessKeyId,
      SignatureProvided: claim.signature,
      StringToSign: text,
      CanonicalRequest: canonical,
    });
  }
  const { presigned, payloadHash, timestamp, signature } = claim;
  return { presigned, payloadHash, timestamp, scope: scopeText(scope), key, signature };
}

/** Compares in constant time. */
export function signaturesMatch(computed: string, given: string): boolean {
  const [left, right] = [Buffer.from(computed), Buffer.from(given)];
  return left.length === right.length && timingSafeEqual(left, right);
}

export function queryValue(query: readonly QueryPair[], name: string): string | undefined {
  return query.find(([candidate]) => candidate === name)?.[1];
}
