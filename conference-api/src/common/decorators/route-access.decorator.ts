import { SetMetadata } from '@nestjs/common';
import type { Permission } from '../../access/permission.js';

export const DECLARATION = 'kerfside:access';

export type RouteDeclaration = { kind: 'public' } | { kind: 'signed-in' } | { kind: 'permission'; permission: Permission };

/** Anyone, signed in or not. */
export const Public = () => SetMetadata(DECLARATION, { kind: 'public' } satisfies RouteDeclaration);

/** Any signed-in person, about their own things. */
export const SignedIn = () => SetMetadata(DECLARATION, { kind: 'signed-in' } satisfies RouteDeclaration);

/** Whoever holds the permission; the use case asks it for the very thing. */
export const RequirePermission = (permission: Permission) =>
  SetMetadata(DECLARATION, { kind: 'permission', permission } satisfies RouteDeclaration);
