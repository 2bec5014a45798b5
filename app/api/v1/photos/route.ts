import { uploadPhotoRoute } from '@/lib/reports/handlers/photos';

export const POST = uploadPhotoRoute.handler;
