import { listMeasurements } from '@/lib/actions/list-measurements';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';

export const GET = handle({ params: idParams }, (ctx, { params }) => listMeasurements(ctx, params.id));
