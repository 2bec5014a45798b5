import { nextAuthHandler } from '@/lib/auth/handlers/next-auth';

export { nextAuthHandler as GET, nextAuthHandler as POST };
