import { Router } from 'express';
import { route } from '#server/http/route.ts';
import { getVocabulary } from '#shared/contracts/vocabulary.ts';
import type { VocabularyService } from './vocabulary.service.ts';

export function vocabularyRoutes(vocabulary: VocabularyService): Router {
  const router = Router();
  route(router, getVocabulary, () => vocabulary.get());
  return router;
}
