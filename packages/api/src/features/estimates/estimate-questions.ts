import type { Question } from '@bookmatch/common/customer-page/questions-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { conflict, notFound } from '../../platform/http/problem-error.js';
import { sendMail } from '../../platform/mail/mail.js';
import { Person } from '../accounts/accounts-public.js';
import { Member, shopOf } from '../shops/shops-public.js';
import { answerLetter, questionLetter } from './estimate-letters.js';
import type { EstimateHooks } from './estimate-hooks.js';
import { EstimateQuestion } from './estimate-question.entity.js';
import { Estimate } from './estimate.entity.js';
import { lettersToShop } from './letters-to-shop.js';
import { customerAddress } from './customer-address.js';

/** What customers ask on an estimate's page, and what the shop answers. */
export class EstimateQuestions {
  constructor(
    private readonly origin: string,
    private readonly hooks: Pick<EstimateHooks, 'linkTo'>,
  ) {}

  /** The customer asks; the people who write estimates get a letter. */
  async ask(
    scope: ShopScope,
    asked: { estimateId: string; linkId: string; body: string },
  ): Promise<Question> {
    const estimate = await scope.rows(Estimate).getForUpdate(asked.estimateId);
    await refuseTooMany(scope, estimate);
    const question = await scope.rows(EstimateQuestion).insert({
      ...asked,
      id: scope.newId(),
      answer: null,
      answeredBy: null,
      answeredAt: null,
    });
    await lettersToShop(scope, this.origin, estimate, questionLetter(asked.body));
    return viewQuestion(question);
  }

  /** The shop answers, once; the customer gets a letter with a link to the page. */
  async answer(scope: ShopScope, key: QuestionKey, body: string): Promise<Question> {
    const questions = scope.rows(EstimateQuestion);
    const question = await questions.findOneBy({ id: key.questionId, estimateId: key.id }, true);
    if (!question) throw notFound('This question');
    if (question.answer !== null) throw conflict('This question was answered already.');
    const answeredBy = await this.actingName(scope);
    const answered = await questions.update(question, { answer: body, answeredBy, answeredAt: scope.now });
    await this.mailAnswer(scope, answered);
    return viewQuestion(answered);
  }

  private async mailAnswer(scope: ShopScope, { estimateId, body, answer }: EstimateQuestion): Promise<void> {
    const estimate = await scope.rows(Estimate).get(estimateId);
    const to = await customerAddress(scope, estimate);
    if (to === null) return;
    const url = await this.hooks.linkTo(scope, estimate);
    await sendMail(scope, {
      to,
      ...answerLetter(await shopOf(scope), estimate, { body, answer: answer ?? '', url }),
    });
  }

  private async actingName(scope: ShopScope): Promise<string> {
    const member = await scope.rows(Member).get(scope.memberId);
    return (await scope.global(Person).get(member.personId)).name;
  }
}
export type QuestionKey = { id: string; questionId: string };

/** Each question is a letter to the shop: who holds a link must not be able to flood it. */
async function refuseTooMany(scope: ShopScope, { id }: Estimate): Promise<void> {
  const open = await scope.rows(EstimateQuestion).findBy({ estimateId: id, answer: null });
  if (open.length >= MAX_OPEN_QUESTIONS)
    throw conflict('The shop has not answered your earlier questions yet. Ask again when it has.');
}
const MAX_OPEN_QUESTIONS = 20;

/** Oldest first. */
export async function questionsOf(scope: ShopScope, estimateId: string): Promise<Question[]> {
  return (await scope.rows(EstimateQuestion).findBy({ estimateId }, 'createdAt')).map(viewQuestion);
}

function viewQuestion(row: EstimateQuestion): Question {
  return {
    id: row.id,
    body: row.body,
    askedAt: row.createdAt.toISOString(),
    answer: row.answer,
    answeredBy: row.answeredBy,
    answeredAt: row.answeredAt?.toISOString() ?? null,
  };
}
