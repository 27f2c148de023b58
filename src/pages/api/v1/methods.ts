/* The methods of the engine, for programs. */
import { type APIRoute } from 'astro';
import { methodList } from '@services/views/methods';
import { json } from '@/http';

export const GET: APIRoute = () => json({ methods: methodList() });
