import { Controller, Get, Res } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { Response } from 'express';
import { Public } from '../common/decorators/route-access.decorator.js';
import { HealthDto } from './health.dto.js';
import { HealthService } from './health.service.js';

@ApiTags('health')
@Controller('health')
export class HealthController {
  constructor(private readonly health: HealthService) {}

  /** The process answers. */
  @Get('live')
  @Public()
  live(): { state: 'up' } {
    return { state: 'up' };
  }

  /** Each part with its state; 503 when one is down. */
  @Get('ready')
  @Public()
  ready(@Res({ passthrough: true }) response: Response): Promise<HealthDto> {
    return this.health.ready(response);
  }
}
