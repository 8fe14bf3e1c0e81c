import { act } from 'react';
import { createRoot, type Root } from 'react-dom/client';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { SignUpForm } from '@/components/account/sign-up-form';

let root: Root;
let page: HTMLElement;
const fetching = vi.fn<typeof fetch>();

const field = (label: string) => {
  const found = [...page.querySelectorAll('label')].find(({ textContent }) => textContent === label);
  const input = found && page.querySelector<HTMLInputElement>(`#${CSS.escape(found.htmlFor)}`);
  if (!input) throw new Error(`no field ${label}`);
  return input;
};
const described = (input: HTMLInputElement) =>
  (input.getAttribute('aria-describedby') ?? '')
    .split(' ')
    .filter(Boolean)
    .map((id) => document.getElementById(id)?.textContent);
const fill = async (label: string, value: string) => {
  await act(async () => {
    // As a person's typing does it: past the setter by which React tells its own writes apart.
    Object.getOwnPropertyDescriptor(HTMLInputElement.prototype, 'value')?.set?.call(field(label), value);
    field(label).dispatchEvent(new Event('input', { bubbles: true }));
  });
};
const submit = () =>
  act(async () => {
    page.querySelector('form')?.dispatchEvent(new Event('submit', { bubbles: true, cancelable: true }));
  });

beforeEach(async () => {
  vi.stubGlobal('IS_REACT_ACT_ENVIRONMENT', true);
  vi.stubGlobal('fetch', fetching.mockReset());
  page = document.body.appendChild(document.createElement('div'));
  root = createRoot(page);
  await act(async () => root.render(<SignUpForm />));
});

afterEach(async () => {
  await act(async () => root.unmount());
  page.remove();
  vi.unstubAllGlobals();
});

describe('the sign-up form', () => {
  it('sends nothing while something is wrong, ties each error to its field and goes to the first', async () => {
    await fill('Name', 'Ada');
    await fill('Password', 'too short');
    await submit();
    expect(fetching).not.toHaveBeenCalled();
    expect(field('Name').getAttribute('aria-invalid')).toBeNull();
    expect(field('E-mail').getAttribute('aria-invalid')).toBe('true');
    expect(described(field('E-mail'))).toContain('Put in your e-mail address.');
    expect(described(field('Password'))).toContain('Too short: at least 10 characters.');
    expect(document.activeElement).toBe(field('E-mail'));
  });

  it('shows at its field what the server says about it, and goes there', async () => {
    const problem = { code: 'invalid', detail: 'x', fields: [{ path: 'password', message: 'Choose another.' }] };
    fetching.mockResolvedValue(new Response(JSON.stringify(problem), { status: 422 }));
    await fill('Name', 'Ada');
    await fill('E-mail', 'ada@example.org');
    await fill('Password', 'three clamps and a caul');
    await submit();
    await vi.waitFor(() => expect(described(field('Password'))).toContain('Choose another.'));
    expect(document.activeElement).toBe(field('Password'));
  });

  it('announces a failure that belongs to no field, and keeps what was typed', async () => {
    fetching.mockResolvedValue(
      new Response(JSON.stringify({ code: 'too-many', detail: 'Wait a while.' }), { status: 429 }),
    );
    await fill('Name', 'Ada');
    await fill('E-mail', 'ada@example.org');
    await fill('Password', 'three clamps and a caul');
    await submit();
    await vi.waitFor(() => expect(page.querySelector('[aria-live=polite]')?.textContent).toContain('Wait a while.'));
    expect(field('E-mail').value).toBe('ada@example.org');
  });

  it('says where the letter went, and takes the focus there', async () => {
    fetching.mockResolvedValue(new Response('{"sent":true}', { status: 200 }));
    await fill('Name', 'Ada');
    await fill('E-mail', 'Ada@Example.org');
    await fill('Password', 'three clamps and a caul');
    await submit();
    await vi.waitFor(() => expect(page.textContent).toContain('ada@example.org'));
    expect(document.activeElement?.querySelector('h2')?.textContent).toBe('Now look in your mail');
  });

  it('shows the password on request', async () => {
    expect(field('Password').type).toBe('password');
    const button = [...page.querySelectorAll('button')].find(({ textContent }) => textContent === 'Show password');
    await act(async () => button?.click());
    expect(field('Password').type).toBe('text');
    expect(button?.getAttribute('aria-pressed')).toBe('true');
  });
});
