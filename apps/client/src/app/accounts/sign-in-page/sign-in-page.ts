import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { type AbstractControl, NonNullableFormBuilder, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatFormField, MatSuffix } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Router } from '@angular/router';
import { problemOf } from '../../core/api/problem';
import { SessionStore } from '../../core/session/session-store';
import { BrandMark } from '../../shared/brand/brand-mark';
import { FindingMark } from '../../shared/findings/finding-mark';
import { Icon } from '../../shared/icon/icon';
import { LaneLine } from '../../shared/lane/lane-line';
import { SAMPLE_LANES } from './sample-lanes';

@Component({
  selector: 'lw-sign-in-page',
  imports: [BrandMark, FindingMark, Icon, LaneLine, MatButton, MatFormField, MatIconButton, MatInput, MatSuffix, ReactiveFormsModule],
  changeDetection: ChangeDetectionStrategy.OnPush,
  styleUrl: './sign-in-page.css',
  templateUrl: './sign-in-page.html',
})
export class SignInPage {
  /** Where the visitor wanted to go, from the address. */
  readonly from = input<string>();
  private readonly store = inject(SessionStore);
  private readonly router = inject(Router);
  protected readonly form = inject(NonNullableFormBuilder).group({
    email: ['', [(c: AbstractControl) => Validators.required(c), (c: AbstractControl) => Validators.email(c)]],
    password: ['', (c: AbstractControl) => Validators.required(c)],
  });
  protected readonly samples = SAMPLE_LANES;
  protected readonly shown = signal(false);
  protected readonly capsLock = signal(false);
  protected readonly busy = signal(false);
  protected readonly refusal = signal<string | null>(null);

  protected async signIn(): Promise<void> {
    const { email, password } = this.form.getRawValue();
    if (this.form.invalid) {
      this.refusal.set('Fill in your e-mail address and your password.');
      return;
    }
    this.busy.set(true);
    this.refusal.set(null);
    try {
      await this.store.signIn(email.trim(), password);
      await this.router.navigateByUrl(withinProduct(this.from()));
    } catch (error) {
      const problem = problemOf(error);
      this.refusal.set([problem.title, problem.detail].filter(Boolean).join('. '));
    } finally {
      this.busy.set(false);
    }
  }

  protected noteCapsLock(event: KeyboardEvent): void {
    this.capsLock.set(event.getModifierState?.('CapsLock') ?? false);
  }
}

/** Only a path of our own: an address in the link must not lead elsewhere. */
const withinProduct = (from: string | undefined): string =>
  from !== undefined && /^\/(?!\/|\\|sign-in)/.test(from) ? from : '/projects';
