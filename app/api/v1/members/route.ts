import { signUpRoute } from '@/lib/members/handlers';

export const POST = signUpRoute.handler;
