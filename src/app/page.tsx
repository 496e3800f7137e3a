import { redirect } from 'next/navigation'

/** The question people come with is the front door. */
export default function HomePage() {
  redirect('/reach')
}
