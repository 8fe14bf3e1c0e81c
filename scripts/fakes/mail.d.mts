export function startFakeMail(options: {
  smtpPort: number;
  pagePort: number;
  folder: string;
  user: string;
  password: string;
}): Promise<{ stop: () => Promise<void> }>;
