import { ApiProperty } from '@nestjs/swagger';
import { IsBoolean, IsEmail, IsIn, IsOptional, IsString, IsUUID, MaxLength } from 'class-validator';
import { DISCIPLINES, type Discipline, type Role, ROLES } from '../../calc/vocabulary/people.js';
import { PageQueryDto } from '../../common/paging/page-query.dto.js';
import { RequiredList, RequiredOneOf, RequiredText } from '../../common/validation/fields.js';

export class ListPeopleDto extends PageQueryDto {
  /** Part of the name or the e-mail address. */
  @IsOptional()
  @IsString()
  @MaxLength(100)
  query?: string;
}

export class InvitedMembershipDto {
  @IsUUID()
  conferenceId: string;

  @RequiredOneOf(ROLES)
  role: Role;
}

export class InvitePersonDto {
  @IsEmail()
  @MaxLength(254)
  email: string;

  @RequiredText(120)
  name: string;

  @RequiredOneOf(DISCIPLINES)
  discipline: Discipline;

  @IsUUID()
  unitId: string;

  @RequiredList(() => InvitedMembershipDto, 20)
  memberships: InvitedMembershipDto[];
}

export class UpdatePersonDto {
  @IsOptional()
  @IsString()
  @MaxLength(120)
  name?: string;

  @IsOptional()
  @IsIn(DISCIPLINES)
  @ApiProperty({ enum: DISCIPLINES, required: false })
  discipline?: Discipline;

  @IsOptional()
  @IsUUID()
  unitId?: string;

  /** False ends all sessions and keeps what the person wrote. */
  @IsOptional()
  @IsBoolean()
  isActive?: boolean;

  @IsOptional()
  @IsBoolean()
  isAdministrator?: boolean;
}

export class PersonMembershipDto {
  conferenceId: string;
  conferenceName: string;
  @ApiProperty({ enum: ROLES }) role: Role;
}

export class PersonDto {
  id: string;
  name: string;
  email: string;
  @ApiProperty({ enum: DISCIPLINES }) discipline: Discipline;
  unitId: string;
  unit: string;
  isActive: boolean;
  isAdministrator: boolean;
  /** False until the invitation is accepted. */
  hasAccepted: boolean;
  memberships: PersonMembershipDto[];
}

export class PersonListDto {
  items: PersonDto[];
  nextCursor: string | null;
}

export class WriteUnitDto {
  @RequiredText(120)
  name: string;

  @IsOptional()
  @IsEmail()
  contactEmail?: string | null;
}

export class UnitDto {
  id: string;
  name: string;
  contactEmail: string | null;
}

export class UnitListDto {
  items: UnitDto[];
}
