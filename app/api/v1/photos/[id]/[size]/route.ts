import { getPhotoRoute } from '@/lib/reports/handlers/photos';

export const GET = getPhotoRoute.handler;
