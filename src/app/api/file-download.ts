import { HttpClient, HttpErrorResponse } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { saveAs } from 'file-saver';
import { firstValueFrom } from 'rxjs';
import { ApiProblem, toApiProblem } from './api-problem.ts';

/** Fetches a file of the API and hands it to the browser to save. */
@Injectable({ providedIn: 'root' })
export class FileDownload {
  private readonly http = inject(HttpClient);

  /**
   * @returns the file's name as the server gave it
   * @throws {ApiProblem} when the server refuses or cannot be reached
   */
  async save(path: string): Promise<string> {
    try {
      const response = await firstValueFrom(
        this.http.get(path, { observe: 'response', responseType: 'blob' }),
      );
      const name = fileName(response.headers.get('Content-Disposition') ?? '');
      saveAs(response.body ?? new Blob(), name);
      return name;
    } catch (error) {
      throw await problemOf(error);
    }
  }
}

/** From `attachment; filename=CR-40_BOM-0007_20260310.pdf`, quoted or not. */
function fileName(disposition: string): string {
  return /filename="?([^";]+)"?/.exec(disposition)?.[1] ?? 'document';
}

/** A refusal of a file arrives as a blob too. */
async function problemOf(error: unknown): Promise<ApiProblem> {
  if (!(error instanceof HttpErrorResponse) || !(error.error instanceof Blob)) {
    return toApiProblem(error);
  }
  const { headers, status, url } = error;
  const text = await error.error.text();
  return toApiProblem(
    new HttpErrorResponse({ error: text, headers, status, ...(url ? { url } : {}) }),
  );
}
