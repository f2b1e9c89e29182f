import { ReviewForm } from "#web/features/build/review-form.tsx";

/** `/build/review` */
export function Component() {
  return <ReviewForm />;
}
