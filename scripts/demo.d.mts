export const demoPassword: string;
export const demoSignIns: { email: string; name: string; role: string; what: string }[];
