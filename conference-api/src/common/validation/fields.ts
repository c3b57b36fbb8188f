import { applyDecorators } from '@nestjs/common';
import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { Transform, Type } from 'class-transformer';
import {
  ArrayMaxSize,
  IsArray,
  IsBoolean,
  IsIn,
  IsInt,
  IsNotEmpty,
  IsNumber,
  IsObject,
  IsOptional,
  IsString,
  Max,
  MaxLength,
  Min,
  ValidateNested,
} from 'class-validator';

type Names = readonly string[] | Record<string, string>;
const namesOf = (names: Names): string[] => (Array.isArray(names) ? [...names] : Object.keys(names));

/** Optional text of at most `length` characters. */
export const OptionalText = (length: number) =>
  applyDecorators(ApiPropertyOptional({ type: String, maxLength: length }), IsOptional(), IsString(), MaxLength(length));

/** Text that has to be there, not only spaces. */
export const RequiredText = (length: number) =>
  applyDecorators(
    ApiProperty({ type: String, maxLength: length }),
    Transform(({ value }: { value: unknown }) => (typeof value === 'string' ? value.trim() : value)),
    IsString(),
    IsNotEmpty(),
    MaxLength(length),
  );

/** One of the names, or null for not known. */
export const OptionalOneOf = (names: Names) =>
  applyDecorators(ApiPropertyOptional({ type: String, enum: namesOf(names), nullable: true }), IsOptional(), IsIn(namesOf(names)));

export const RequiredOneOf = (names: Names) => applyDecorators(ApiProperty({ type: String, enum: namesOf(names) }), IsIn(namesOf(names)));

/** Any of the names, each once. */
export const OptionalNames = (names: Names) =>
  applyDecorators(
    ApiPropertyOptional({ type: String, enum: namesOf(names), isArray: true }),
    IsOptional(),
    IsArray(),
    ArrayMaxSize(namesOf(names).length),
    IsIn(namesOf(names), { each: true }),
  );

/** A number in its bounds, or null for not known. */
export const OptionalNumber = (low: number, high: number) =>
  applyDecorators(
    ApiPropertyOptional({ type: Number, minimum: low, maximum: high, nullable: true }),
    IsOptional(),
    IsNumber({ allowNaN: false, allowInfinity: false }),
    Min(low),
    Max(high),
  );

export const OptionalInteger = (low: number, high: number) =>
  applyDecorators(ApiPropertyOptional({ type: 'integer', minimum: low, maximum: high, nullable: true }), IsOptional(), IsInt(), Min(low), Max(high));

export const RequiredInteger = (low: number, high: number) =>
  applyDecorators(ApiProperty({ type: 'integer', minimum: low, maximum: high }), IsInt(), Min(low), Max(high));

export const OptionalFlag = () => applyDecorators(ApiPropertyOptional({ type: Boolean, nullable: true }), IsOptional(), IsBoolean());

/** A list of nested objects. */
export const OptionalList = (itemType: () => new () => object, most: number) =>
  applyDecorators(
    ApiPropertyOptional({ type: () => itemType(), isArray: true }),
    IsOptional(),
    IsArray(),
    ArrayMaxSize(most),
    IsObject({ each: true }),
    ValidateNested({ each: true }),
    Type(itemType),
  );

export const RequiredList = (itemType: () => new () => object, most: number) =>
  applyDecorators(ApiProperty({ type: () => itemType(), isArray: true }), IsArray(), ArrayMaxSize(most), IsObject({ each: true }), ValidateNested({ each: true }), Type(itemType));

/** A nested object that may be left out. */
export const OptionalObject = (type: () => new () => object) =>
  applyDecorators(ApiPropertyOptional({ type: () => type() }), IsOptional(), IsObject(), ValidateNested(), Type(type));
