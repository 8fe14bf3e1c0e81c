import 'server-only';

/** The person behind a request, as far as a handler may know. */
export interface Account {
  id: string;
  email: string;
  name: string;
  role: 'member' | 'author' | 'operator';
}

/** One sign-in on one device. */
export interface Session {
  id: string;
  expiresAt: Date;
}
