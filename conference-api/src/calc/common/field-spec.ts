/** The JSON types a top-level field of a calculator's body may have. */
export type JsonType = 'number' | 'string' | 'boolean' | 'array' | 'object';

/** One top-level field, from which the HTTP layer refuses unknown names and wrong types. */
export interface FieldSpec {
  readonly name: string;
  readonly type: JsonType;
}
