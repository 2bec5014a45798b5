import { confirmAddressRoute } from '@/lib/members/handlers';

export const POST = confirmAddressRoute.handler;
