import 'server-only';
import { issueToken } from '../auth/link-token';
import { db } from '../db';
import { env } from '../env';
import type { Letter } from './letter';
import type { LetterOrder } from './letter-order';
import {
  addressChangedLetter,
  addressInUseLetter,
  alreadyAccountLetter,
  confirmAddressLetter,
  confirmNewAddressLetter,
  newAddressAskedLetter,
  passwordChangedLetter,
  resetPasswordLetter,
} from './letters';

export interface AddressedLetter {
  to: string;
  letter: Letter;
}

/**
 * Writes an ordered letter by how things stand now, with its link. Composed again after a failed sending, it gets a new
 * link; the older one works as well until one of them is used.
 *
 * @returns null where there is nobody to write to
 */
export async function composeLetter(order: LetterOrder): Promise<AddressedLetter | null> {
  const site = env().NEXTAUTH_URL.replace(/\/+$/, '');
  const { Account } = db().models;
  switch (order.letter) {
    case 'confirm-address': {
      const account = await Account.findOne({ where: { email: order.email } });
      if (!account) return null;
      if (account.emailConfirmedAt) return { to: account.email, letter: alreadyAccountLetter(site) };
      return { to: account.email, letter: confirmAddressLetter(site, await issueToken(account.id, 'confirm-email')) };
    }
    case 'reset-password': {
      const account = await Account.findOne({ where: { email: order.email } });
      if (!account) return null;
      return { to: account.email, letter: resetPasswordLetter(site, await issueToken(account.id, 'reset-password')) };
    }
    case 'password-changed': {
      const account = await Account.findByPk(order.accountId);
      return account && { to: account.email, letter: passwordChangedLetter(site) };
    }
    case 'confirm-new-address': {
      const holder = await Account.findOne({ where: { email: order.email } });
      if (holder) return { to: order.email, letter: addressInUseLetter(site) };
      if (!(await Account.findByPk(order.accountId))) return null;
      const secret = await issueToken(order.accountId, 'change-email', order.email);
      return { to: order.email, letter: confirmNewAddressLetter(site, secret) };
    }
    case 'new-address-asked':
      return { to: order.email, letter: newAddressAskedLetter(site, order.newEmail) };
    case 'address-changed':
      return { to: order.email, letter: addressChangedLetter(site, order.newEmail) };
  }
}
