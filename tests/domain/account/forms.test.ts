import { describe, expect, it } from 'vitest';
import { deviceWords } from '@/lib/domain/account/device-words';
import { emailAddress, maskEmail } from '@/lib/domain/account/email-address';
import { resetForm, signUpForm } from '@/lib/domain/account/forms';
import { safeReturn } from '@/lib/domain/account/safe-return';

describe('an e-mail address', () => {
  it('is trimmed and put in lower case', () => {
    expect(emailAddress.parse('  Ada@Example.ORG ')).toBe('ada@example.org');
  });

  it.each(['', 'ada', 'ada@', '@example.org', 'ada@example', 'a b@example.org', `${'a'.repeat(250)}@example.org`])(
    'is not %j',
    (address) => {
      expect(emailAddress.safeParse(address).success).toBe(false);
    },
  );

  it('is masked to its first letter and its host', () => {
    expect(maskEmail('ada@example.org')).toBe('a…@example.org');
  });
});

describe('forms', () => {
  it('refuse fields that they do not have', () => {
    const form = { name: 'Ada', email: 'a@example.org', password: 'three clamps and a caul', role: 'operator' };
    expect(signUpForm.safeParse(form).success).toBe(false);
  });

  it('take a link’s secret whole or not at all', () => {
    const password = 'three clamps and a caul';
    expect(resetForm.safeParse({ token: 'A'.repeat(43), password }).success).toBe(true);
    expect(resetForm.safeParse({ token: 'A'.repeat(42), password }).success).toBe(false);
    expect(resetForm.safeParse({ token: `${'A'.repeat(42)}=`, password }).success).toBe(false);
  });
});

describe('safeReturn', () => {
  it.each(['/desk', '/bench?build=1&view=step', '/desk/plans#top'])('follows %s', (asked) => {
    expect(safeReturn(asked, '/')).toBe(asked);
  });

  it.each([
    null,
    '',
    'desk',
    '//elsewhere.example',
    '/\\elsewhere.example',
    '/\t/elsewhere.example',
    '/desk\\..\\x',
    'https://elsewhere.example',
    'javascript:alert(1)',
  ])('does not follow %j', (asked) => {
    expect(safeReturn(asked, '/desk')).toBe('/desk');
  });
});

describe('deviceWords', () => {
  it.each([
    ['Mozilla/5.0 (Android 16; Mobile; rv:140.0) Gecko/140.0 Firefox/140.0', 'Firefox on an Android phone'],
    [
      'Mozilla/5.0 (Linux; Android 15; K) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/140.0.0.0 Mobile Safari/537.36',
      'Chrome on an Android phone',
    ],
    [
      'Mozilla/5.0 (Linux; Android 15; K) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/140.0.0.0 Safari/537.36',
      'Chrome on an Android tablet',
    ],
    [
      'Mozilla/5.0 (iPhone; CPU iPhone OS 19_0 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/19.0 Mobile/15E148 Safari/604.1',
      'Safari on an iPhone',
    ],
    [
      'Mozilla/5.0 (Windows NT 10.0; Win64; x64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/140.0.0.0 Safari/537.36 Edg/140.0.0.0',
      'Edge on a Windows computer',
    ],
    ['Mozilla/5.0 (X11; Linux x86_64; rv:140.0) Gecko/20100101 Firefox/140.0', 'Firefox on a Linux computer'],
    ['curl/8.0', 'A browser that does not say what it is'],
    ['', 'A browser that does not say what it is'],
  ])('%s', (userAgent, words) => {
    expect(deviceWords(userAgent)).toBe(words);
  });
});
