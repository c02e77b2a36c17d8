import { TestBed } from '@angular/core/testing';
import { Router } from '@angular/router';
import { SessionStore } from '../../core/session/session-store';
import { SignInPage } from './sign-in-page';

async function page(from?: string, signIn = vi.fn().mockResolvedValue(undefined)) {
  const router = { navigateByUrl: vi.fn().mockResolvedValue(true) };
  TestBed.configureTestingModule({ providers: [{ provide: SessionStore, useValue: { signIn } }, { provide: Router, useValue: router }] });
  const fixture = TestBed.createComponent(SignInPage);
  fixture.componentRef.setInput('from', from);
  await fixture.whenStable();
  const host = fixture.nativeElement as HTMLElement;
  const fill = (id: string, value: string) => {
    const field = host.querySelector<HTMLInputElement>(`#${id}`)!;
    field.value = value;
    field.dispatchEvent(new Event('input'));
  };
  const submit = async () => {
    host.querySelector('form')!.dispatchEvent(new Event('submit'));
    await fixture.whenStable();
  };
  return { host, fill, submit, signIn, router };
}

describe('SignInPage', () => {
  it('asks for what is missing and sends nothing', async () => {
    const { host, submit, signIn } = await page();
    await submit();
    expect(host.querySelector('[role="alert"]')?.textContent).toContain('Fill in');
    expect(signIn).not.toHaveBeenCalled();
  });

  it.each([
    ['/projects/p1/points', '/projects/p1/points'],
    [undefined, '/projects'],
    ['//elsewhere.example', '/projects'],
    ['https://elsewhere.example', '/projects'],
    ['/\\elsewhere.example', '/projects'],
  ])('from %s leads to %s', async (from, to) => {
    const { fill, submit, router } = await page(from);
    fill('email', 'engineer@brackwater.example');
    fill('password', 'secret');
    await submit();
    expect(router.navigateByUrl).toHaveBeenCalledWith(to);
  });

  it('says why the server refused', async () => {
    const { host, fill, submit } = await page(undefined, vi.fn().mockRejectedValue(new Error('E-mail or password is wrong')));
    fill('email', 'engineer@brackwater.example');
    fill('password', 'wrong');
    await submit();
    expect(host.querySelector('[role="alert"]')?.textContent).toContain('E-mail or password is wrong');
  });
});
