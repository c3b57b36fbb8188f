import { createParamDecorator, type ExecutionContext } from '@nestjs/common';
import type { Actor } from '../../access/actor.js';

/** The signed-in person of the request. */
export const CurrentActor = createParamDecorator((_: unknown, context: ExecutionContext): Actor => context.switchToHttp().getRequest().user);
