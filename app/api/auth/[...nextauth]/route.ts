import { handleNextAuth } from '@/lib/http/handle-next-auth';

export { handleNextAuth as GET, handleNextAuth as POST };
