import { previewFiguresRoute } from '@/lib/reports/handlers/reports';

export const POST = previewFiguresRoute.handler;
