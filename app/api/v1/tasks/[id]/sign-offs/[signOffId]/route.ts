import { withdrawSignOff } from '@/lib/actions/withdraw-sign-off';
import { handle } from '@/lib/http/handle';
import { signOffParams } from '@/lib/schemas/work';

export const DELETE = handle({ params: signOffParams }, (ctx, { params }) =>
  withdrawSignOff(ctx, params.id, params.signOffId),
);
