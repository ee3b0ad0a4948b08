import { HttpBackend } from '@angular/common/http';
import { mergeApplicationConfig, type ApplicationConfig } from '@angular/core';
import { provideServerRendering, withRoutes } from '@angular/ssr';
import { appConfig } from './app.config';
import { serverRoutes } from './app.routes.server';
import { InternalBackend } from './core/internal-backend';

const onServer: ApplicationConfig = {
  providers: [
    provideServerRendering(withRoutes(serverRoutes)),
    { provide: HttpBackend, useClass: InternalBackend },
  ],
};

export const serverConfig = mergeApplicationConfig(appConfig, onServer);
