import { Global, Module } from '@nestjs/common';
import { DiscoveryModule } from '@nestjs/core';
import { AccessService } from './access.service.js';
import { RouteDeclarations } from './route-declarations.js';

@Global()
@Module({ imports: [DiscoveryModule], providers: [AccessService, RouteDeclarations], exports: [AccessService] })
export class AccessModule {}
