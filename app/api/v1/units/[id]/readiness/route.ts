import { getUnitReadiness } from '@/lib/actions/get-unit-readiness';
import { handle } from '@/lib/http/handle';
import { idParams } from '@/lib/schemas/common';

export const GET = handle({ params: idParams }, (ctx, { params }) => getUnitReadiness(ctx, params.id));
