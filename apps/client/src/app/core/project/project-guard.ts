import { inject } from '@angular/core';
import type { CanActivateFn } from '@angular/router';
import { ProjectStore } from './project-store';

/** Opens the project that the address names; the pages show its loading and error states themselves. */
export const projectGuard: CanActivateFn = (route) => {
  void inject(ProjectStore).open(route.paramMap.get('projectId') ?? '');
  return true;
};
