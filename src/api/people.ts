import { z } from 'zod';
import { account, type Account, type ChangePersonRequest, type CreatePersonRequest } from '#contract';
import { request } from './client';

export const getPeople = (): Promise<Account[]> => request(z.array(account), 'GET', '/people');
export const createPerson = (body: CreatePersonRequest): Promise<Account> =>
  request(account, 'POST', '/people', { body });
export const changePerson = (id: string, body: ChangePersonRequest): Promise<Account> =>
  request(account, 'PATCH', `/people/${id}`, { body });
