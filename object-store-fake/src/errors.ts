/** S3's own codes, with the status and the message S3 gives when nothing more exact is known. */
const ERRORS = {
  AccessDenied: [403, 'Access Denied'],
  AuthorizationHeaderMalformed: [400, 'The authorization header is malformed'],
  AuthorizationQueryParametersError: [400, 'The authorization query parameters are malformed'],
  BadDigest: [400, 'The checksum you specified did not match what we received'],
  BucketAlreadyOwnedByYou: [409, 'Your previous request to create the named bucket succeeded and you already own it'],
  EntityTooLarge: [400, 'Your proposed upload exceeds the maximum allowed size'],
  EntityTooSmall: [400, 'Your proposed upload is smaller than the minimum allowed size'],
  IllegalLocationConstraintException: [400, 'The location constraint does not fit the region of this endpoint'],
  IncompleteBody: [400, 'The request body ended early or did not have the length it announced'],
  InternalError: [500, 'We encountered an internal error. Please try again'],
  InvalidAccessKeyId: [403, 'The AWS Access Key Id you provided does not exist in our records'],
  InvalidArgument: [400, 'Invalid Argument'],
  InvalidBucketName: [400, 'The specified bucket is not valid'],
  InvalidDigest: [400, 'The Content-MD5 you specified is not valid'],
  InvalidPart: [400, 'One or more of the specified parts could not be found, or its ETag did not match'],
  InvalidPartOrder: [400, 'The list of parts was not in ascending order'],
  InvalidRange: [416, 'The requested range is not satisfiable'],
  InvalidRequest: [400, 'Invalid Request'],
  InvalidURI: [400, 'Could not parse the specified URI'],
  KeyTooLongError: [400, 'Your key is too long'],
  MalformedTrailerError: [400, 'The request contained trailing data that was not well-formed or did not conform to what was announced'],
  MalformedXML: [400, 'The XML you provided was not well-formed or did not validate against our published schema'],
  MetadataTooLarge: [400, 'Your metadata headers exceed the maximum allowed metadata size'],
  MethodNotAllowed: [405, 'The specified method is not allowed against this resource'],
  MissingContentLength: [411, 'You must provide the Content-Length HTTP header'],
  NoSuchBucket: [404, 'The specified bucket does not exist'],
  NoSuchKey: [404, 'The specified key does not exist'],
  NoSuchUpload: [404, 'The specified multipart upload does not exist'],
  NotImplemented: [501, 'A header or query you provided implies functionality that is not implemented'],
  PreconditionFailed: [412, 'At least one of the preconditions you specified did not hold'],
  RequestTimeTooSkewed: [403, 'The difference between the request time and the current time is too large'],
  SignatureDoesNotMatch: [403, 'The request signature we calculated does not match the signature you provided'],
  SlowDown: [503, 'Please reduce your request rate'],
  XAmzContentSHA256Mismatch: [400, "The provided 'x-amz-content-sha256' header does not match what was computed"],
} as const satisfies Record<string, readonly [number, string]>;

export type S3ErrorCode = keyof typeof ERRORS;

/** A refusal in S3's terms; `details` become further elements of the XML answer. */
export class S3Error extends Error {
  readonly status: number;

  constructor(
    readonly code: S3ErrorCode,
    message: string = ERRORS[code][1],
    readonly details: Readonly<Record<string, string>> = {},
  ) {
    super(message);
    this.name = 'S3Error';
    this.status = ERRORS[code][0];
  }
}
