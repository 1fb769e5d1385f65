import { answerAuth } from '@/lib/access/auth-answer';

export { answerAuth as GET, answerAuth as POST };
