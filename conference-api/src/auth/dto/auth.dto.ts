import { ApiProperty } from '@nestjs/swagger';
import { IsEmail, IsString, MaxLength, MinLength } from 'class-validator';
import { DISCIPLINES, type Discipline, type Role, ROLES } from '../../calc/vocabulary/people.js';
import { RequiredText } from '../../common/validation/fields.js';

export class SignInDto {
  @IsString()
  @MaxLength(254)
  email: string;

  @IsString()
  @MaxLength(256)
  password: string;
}

export class AccessTokenDto {
  accessToken: string;
  /** Seconds. */
  expiresIn: number;
}

export class RequestPasswordResetDto {
  @IsEmail()
  @MaxLength(254)
  email: string;
}

export class SetPasswordDto {
  @IsString()
  @MaxLength(200)
  token: string;

  @IsString()
  @MinLength(1)
  @MaxLength(256)
  password: string;
}

export class InvitationDto {
  email: string;
  name: string;
  unit: string;
  conferences: string[];
}

export class AcceptInvitationDto {
  @RequiredText(120)
  name: string;

  @IsString()
  @MinLength(1)
  @MaxLength(256)
  password: string;
}

export class ChangePasswordDto {
  @IsString()
  @MaxLength(256)
  current: string;

  @IsString()
  @MinLength(1)
  @MaxLength(256)
  next: string;
}

export class MembershipDto {
  conferenceId: string;
  conferenceName: string;
  @ApiProperty({ enum: ROLES }) role: Role;
}

export class MeDto {
  id: string;
  name: string;
  email: string;
  @ApiProperty({ enum: DISCIPLINES }) discipline: Discipline;
  unit: string;
  isAdministrator: boolean;
  memberships: MembershipDto[];
}

export class SessionDto {
  id: string;
  device: string;
  address: string;
  createdAt: string;
  lastUsedAt: string;
  isCurrent: boolean;
}

export class SessionListDto {
  items: SessionDto[];
}
