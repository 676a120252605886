import NextAuth from 'next-auth';
import { authOptions } from '@/lib/web/auth';

const handler = (request: Request, segment: { params: Promise<{ nextauth: string[] }> }) => NextAuth(authOptions())(request, segment);
export { handler as GET, handler as POST };
