import { IsHexadecimal, IsNumberString, Length, MaxLength } from 'class-validator';

export class SignedAddressDto {
  /** Seconds since 1970. */
  @IsNumberString()
  @MaxLength(12)
  expires: string;

  @IsHexadecimal()
  @Length(64, 64)
  signature: string;
}
