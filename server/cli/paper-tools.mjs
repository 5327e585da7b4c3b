import { aptInstall } from './apt-install.mjs'
import { runCommand } from './run-command.mjs'

/** `pdftotext` and `pdftoppm`, with which the tests read the PDFs as a person would. @param {(line: string) => void} [say] */
export async function ensurePaperTools(say) {
  const there = await Promise.all(['pdftotext', 'pdftoppm'].map((program) => runCommand(program, ['-v'])))
  if (there.every(({ code }) => code === 0)) return true
  await aptInstall(['poppler-utils'], { say, otherwise: 'put pdftotext and pdftoppm of Poppler on the PATH' })
  return true
}
