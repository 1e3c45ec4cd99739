import { session, type Session, type SignInRequest } from '#contract';
import { command, request } from './client';

export const getSession = (): Promise<Session> => request(session, 'GET', '/session');
export const signIn = (body: SignInRequest): Promise<Session> => request(session, 'POST', '/session', { body });
export const signOut = (): Promise<void> => command('DELETE', '/session');
