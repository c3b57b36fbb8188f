import { Body, Controller, HttpCode, Param, Post } from '@nestjs/common';
import { ApiBody, ApiOkResponse, ApiParam, ApiTags } from '@nestjs/swagger';
import { SignedIn } from '../common/decorators/route-access.decorator.js';
import { CalculatorsService } from './calculators.service.js';
import { CALCULATOR_NAMES } from './registry.js';

const ANY_OBJECT = { type: 'object', additionalProperties: true };

@ApiTags('calculators')
@Controller('calculators')
export class CalculatorsController {
  constructor(private readonly calculators: CalculatorsService) {}

  /** One published calculation; null or absent means not known. The answer names the definition and its cautions. */
  @Post(':name')
  @HttpCode(200)
  @SignedIn()
  @ApiParam({ name: 'name', enum: CALCULATOR_NAMES })
  @ApiBody({ schema: ANY_OBJECT })
  @ApiOkResponse({
    schema: {
      type: 'object',
      additionalProperties: true,
      required: ['definition', 'cautions'],
      properties: { definition: { type: 'string' }, cautions: { type: 'array', items: { type: 'string' } } },
    },
  })
  calculate(@Param('name') name: string, @Body() body: unknown): object {
    return this.calculators.calculate(name, body);
  }
}
