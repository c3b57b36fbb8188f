import type { INestApplication } from '@nestjs/common';
import { DocumentBuilder, type OpenAPIObject, SwaggerModule } from '@nestjs/swagger';

/** The whole API as an OpenAPI document. */
export function openApiDocument(app: INestApplication): OpenAPIObject {
  const builder = new DocumentBuilder()
    .setTitle('Kerfside')
    .setDescription('Refusals are problem documents (RFC 9457).')
    .setVersion('1')
    .addBearerAuth()
    .addSecurityRequirements('bearer');
  return SwaggerModule.createDocument(app, builder.build(), {
    operationIdFactory: (controller, method) => `${controller.replace(/Controller$/, '')}_${method}`,
  });
}
