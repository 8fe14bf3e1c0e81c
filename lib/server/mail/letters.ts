import { maskEmail } from '@/lib/domain/account/email-address';
import { writeLetter, type Letter } from './letter';

/**
 * The letters about accounts. None repeats what a stranger typed, a name for instance: a sign-up sends a letter to any
 * address that is put in, and must not carry someone's message there.
 *
 * @param siteUrl  public address of the site, without a slash at the end
 */

export function confirmAddressLetter(siteUrl: string, secret: string): Letter {
  return writeLetter({
    subject: 'Confirm your address for Holdfast',
    before: [
      'An account at Holdfast was asked for with this address. Confirm that the address is yours, with the password that you chose, and you are in.',
    ],
    link: { label: 'Confirm this address', url: `${siteUrl}/confirm#token=${secret}` },
    after: [
      'The link works once, within 48 hours. If you did not ask for this, leave it: without the link nothing comes of it.',
    ],
  });
}

export function alreadyAccountLetter(siteUrl: string): Letter {
  return writeLetter({
    subject: 'You already have an account at Holdfast',
    before: [
      'An account at Holdfast was asked for with this address, and you already have one. Nothing was changed: your password is the one that you had.',
    ],
    link: { label: 'Sign in', url: `${siteUrl}/sign-in` },
    after: [
      `If you do not know the password any more, set a new one here: ${siteUrl}/forgotten`,
      'If it was not you who asked, you need do nothing.',
    ],
  });
}

export function resetPasswordLetter(siteUrl: string, secret: string): Letter {
  return writeLetter({
    subject: 'Set a new password for Holdfast',
    before: ['A new password was asked for, for your account at Holdfast.'],
    link: { label: 'Set a new password', url: `${siteUrl}/reset#token=${secret}` },
    after: [
      'The link works once, within one hour. With the new password every device is signed out; what a phone has not yet sent stays on it until you sign in there again.',
      'If it was not you who asked, leave it: your password stays as it is.',
    ],
  });
}

export function passwordChangedLetter(siteUrl: string): Letter {
  return writeLetter({
    subject: 'Your password at Holdfast was changed',
    before: ['The password of your account at Holdfast was changed just now, and your other devices were signed out.'],
    after: [`If it was not you, set a new password at once: ${siteUrl}/forgotten`],
  });
}

export function confirmNewAddressLetter(siteUrl: string, secret: string): Letter {
  return writeLetter({
    subject: 'Confirm your new address for Holdfast',
    before: ['An account at Holdfast is to use this address from now on.'],
    link: { label: 'Use this address', url: `${siteUrl}/new-address#token=${secret}` },
    after: ['The link works once, within 24 hours. If you did not ask for this, leave it: nothing comes of it.'],
  });
}

export function addressInUseLetter(siteUrl: string): Letter {
  return writeLetter({
    subject: 'This address already has an account at Holdfast',
    before: [
      'Another account at Holdfast was to use this address, and you already have an account with it. Nothing was changed.',
    ],
    link: { label: 'Sign in', url: `${siteUrl}/sign-in` },
    after: ['If it was not you who asked, you need do nothing.'],
  });
}

export function newAddressAskedLetter(siteUrl: string, newEmail: string): Letter {
  return writeLetter({
    subject: 'A change of address was asked for at Holdfast',
    before: [
      `Your account at Holdfast is to use another address, ${maskEmail(newEmail)}. Until that one is confirmed nothing changes.`,
    ],
    after: [
      `If it was not you, someone knows your password. Set a new one: ${siteUrl}/forgotten. That also ends the change of address.`,
    ],
  });
}

export function addressChangedLetter(siteUrl: string, newEmail: string): Letter {
  return writeLetter({
    subject: 'Your address at Holdfast was changed',
    before: [
      `Your account at Holdfast now uses another address, ${maskEmail(newEmail)}. This is the last letter to this one.`,
    ],
    after: [`If it was not you, write to whoever runs ${siteUrl} and keep this letter.`],
  });
}
