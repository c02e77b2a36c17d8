import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { SessionStore } from '../../core/session/session-store';
import { CataloguePage } from './catalogue-page';

const supply = (id: string, typeVersion: number, ratedA: number) => ({
  id, name: 'Supply, 24 V DC', typeVersion, ratedA, deratingFromC: 50, deratingPercentPerK: 2.5, tolerancePercent: 2, shortCircuitA: 60, extraLowVoltage: 'PELV',
});
const catalogue = { dispenserTypes: [], moduleTypes: [], cableTypes: [], supplyTypes: [supply('s1', 1, 5), supply('s2', 2, 10)], greases: [] };

async function page(canWrite = true) {
  TestBed.configureTestingModule({ providers: [
    provideHttpClient(), provideHttpClientTesting(), provideRouter([]), { provide: SessionStore, useValue: { can: () => canWrite } },
  ] });
  const http = TestBed.inject(HttpTestingController);
  const fixture = TestBed.createComponent(CataloguePage);
  fixture.componentRef.setInput('kind', 'supplyTypes');
  http.expectOne('/api/v1/catalogue').flush(catalogue);
  const settled = async () => {
    await new Promise((resolve) => setTimeout(resolve));
    await fixture.whenStable();
  };
  await settled();
  const host = fixture.nativeElement as HTMLElement;
  const press = async (text: string) => {
    [...host.querySelectorAll('button')].find((button) => button.textContent?.trim().startsWith(text))!.click();
    await settled();
  };
  const fill = async (key: string, value: string) => {
    const field = host.querySelector<HTMLInputElement>(`[data-field="${key}"]`)!;
    field.value = value;
    field.dispatchEvent(new Event('input'));
    await settled();
  };
  return { host, http, press, fill, settled };
}

describe('CataloguePage', () => {
  it('lists the latest version, and the older ones beside it', async () => {
    const { host, press } = await page();
    expect(host.querySelectorAll('lw-type-table tbody tr')).toHaveLength(1);
    await press('Supply, 24 V DC');
    expect(host.querySelector('lw-type-panel')?.textContent).toContain('Version 2, the latest');
    await press('Version 1');
    expect(host.querySelector('lw-type-panel')?.textContent).toMatch(/Rated current.*5\s?A/s);
  });

  it('sends an edit as a new version of the name and opens what the server made', async () => {
    const { host, http, press, fill, settled } = await page();
    await press('Supply, 24 V DC');
    await press('New version');
    await fill('ratedA', '12,5');
    await press('Save new version');
    const post = http.expectOne({ method: 'POST', url: '/api/v1/catalogue/supply-types' });
    expect(post.request.body).toMatchObject({ name: 'Supply, 24 V DC', ratedA: 12.5, shortCircuitA: 60 });
    post.flush(supply('s3', 3, 12.5));
    await settled();
    expect(host.querySelector('lw-type-panel')?.textContent).toContain('Version 3, the latest');
  });

  it('says at the fields what is wrong and sends nothing', async () => {
    const { host, http, press, fill } = await page();
    await press('New supply type');
    await fill('name', 'Supply, 24 V DC');
    await fill('ratedA', '0');
    await press('Save new supply type');
    http.expectNone('/api/v1/catalogue/supply-types');
    const said = [...host.querySelectorAll('.error')].map((element) => element.textContent);
    expect(said[0]).toContain('A type of this name exists');
    expect(said).toContain('More than 0 A.');
  });

  it('shows a refusal of the server at its field', async () => {
    const { host, http, press, settled } = await page();
    await press('Supply, 24 V DC');
    await press('New version');
    await press('Save new version');
    http.expectOne('/api/v1/catalogue/supply-types').flush(
      { type: 'invalid-input', title: 'Some values are not possible', status: 422, errors: [{ field: 'ratedA', message: 'too much' }] }, { status: 422, statusText: 'Unprocessable' });
    await settled();
    expect(host.querySelector('.error')?.textContent).toBe('too much');
  });

  it('asks before it throws away what was typed', async () => {
    const { host, press, fill } = await page();
    await press('New supply type');
    await fill('ratedA', '4');
    await press('Cancel');
    expect(host.textContent).toContain('What you typed is not saved');
    await press('Discard');
    expect(host.querySelector('lw-type-form')).toBeNull();
  });

  it('shows no controls to those who may only read', async () => {
    const { host, press } = await page(false);
    await press('Supply, 24 V DC');
    expect(host.textContent).not.toContain('New supply type');
    expect(host.textContent).not.toContain('New version');
  });
});
