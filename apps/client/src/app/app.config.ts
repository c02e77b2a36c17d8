import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { type ApplicationConfig, provideBrowserGlobalErrorListeners } from '@angular/core';
import { MAT_FORM_FIELD_DEFAULT_OPTIONS, type MatFormFieldDefaultOptions } from '@angular/material/form-field';
import { provideRouter, TitleStrategy, withComponentInputBinding, withRouterConfig } from '@angular/router';
import { routes } from './app.routes';
import { PageTitle } from './core/shell/page-title';
import { sessionInterceptor } from './core/session/session-interceptor';

/** Labels stand above the field, and no room is kept for messages that are not there. */
const formFields: MatFormFieldDefaultOptions = { appearance: 'outline', subscriptSizing: 'dynamic' };

export const appConfig: ApplicationConfig = {
  providers: [
    provideBrowserGlobalErrorListeners(),
    provideRouter(routes, withComponentInputBinding(), withRouterConfig({ paramsInheritanceStrategy: 'always' })),
    // XMLHttpRequest, not fetch: only it tells how much of an upload has gone.
    provideHttpClient(withInterceptors([sessionInterceptor])),
    { provide: TitleStrategy, useExisting: PageTitle },
    { provide: MAT_FORM_FIELD_DEFAULT_OPTIONS, useValue: formFields },
  ],
};
