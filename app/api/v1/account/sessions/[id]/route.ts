import { endSessionRoute } from '@/lib/members/handlers';

export const DELETE = endSessionRoute.handler;
