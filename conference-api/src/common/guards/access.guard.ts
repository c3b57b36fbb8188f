import { type ExecutionContext, Injectable } from '@nestjs/common';
import { Reflector } from '@nestjs/core';
import { AuthGuard } from '@nestjs/passport';
import { mayOnSite } from '../../access/access.policy.js';
import type { Actor } from '../../access/actor.js';
import { ADMINISTRATOR_PERMISSIONS, ROLE_PERMISSIONS } from '../../access/role-permissions.js';
import { JwtStrategy } from '../../auth/jwt.strategy.js';
import { DECLARATION, type RouteDeclaration } from '../decorators/route-access.decorator.js';
import { forbidden, Problem } from '../problems/problem.js';

/** For every route: no token, no entry, unless it is public. */
@Injectable()
export class AccessGuard extends AuthGuard() {
  constructor(
    private readonly reflector: Reflector,
    strategy: JwtStrategy,
  ) {
    super({ defaultStrategy: strategy.strategyName });
  }

  override async canActivate(context: ExecutionContext): Promise<boolean> {
    const declaration = this.reflector.getAllAndOverride<RouteDeclaration | undefined>(DECLARATION, [context.getHandler(), context.getClass()]);
    if (declaration?.kind === 'public') return true;
    await super.canActivate(context);
    if (declaration?.kind === 'signed-in') return true;
    if (declaration?.kind !== 'permission') throw forbidden('This route declares no permission.');
    const actor = context.switchToHttp().getRequest<{ user: Actor }>().user;
    const { permission } = declaration;
    if (ADMINISTRATOR_PERMISSIONS.has(permission)) {
      if (!mayOnSite(actor, permission)) throw forbidden('Only an administrator may do this.');
      return true;
    }
    // coarse: held in some conference; the use case asks for the very thing, and answers 404 where it may not be known.
    // Reading permissions, held by all members, pass here so that a stranger gets 404 and not 403.
    const held = [...actor.roles.values()].some((role) => ROLE_PERMISSIONS[role].has(permission));
    if (!held && actor.roles.size > 0 && !isReading(permission)) throw forbidden('Your role does not allow this.');
    return true;
  }

  override handleRequest<T>(error: unknown, user: T | false | null): T {
    if (error) throw error;
    if (!user) throw new Problem('unauthorized', 'The access token is missing, forged or expired: sign in, or renew it.');
    return user;
  }
}

const isReading = (permission: string) => permission.endsWith('.read');
